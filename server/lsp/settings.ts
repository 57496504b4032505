// The person's settings, `stokehold.*`, as the server uses them. Whatever a client sends is checked here, and what makes no
// sense counts as not set. Knows no connection. Invariant: every setting has a value, whatever was sent.
import { LARGEST_TEXT } from '../../grammar/parse.ts';
import type { Severity } from '../findings/finding.ts';
import type { SeverityChoices } from '../features/diagnostics.ts';

export interface Settings {
  /** `stokehold.pause`: how long nothing must be typed before a document is worked out, in milliseconds. */
  readonly pauseMs: number;
  /** `stokehold.largestFile`: of a longer text, in characters, only the definitions that are seen are read. */
  readonly largestText: number;
  /** `stokehold.severity`: a lower severity, or `off`, for single finding codes. */
  readonly severities: SeverityChoices;
}

export const DEFAULT_SETTINGS: Settings = {
  pauseMs: 100,
  largestText: LARGEST_TEXT,
  severities: new Map(),
};

const LONGEST_PAUSE_MS = 10_000;
const CHARACTERS_PER_MEGABYTE = 1_000_000;
/** The bounds of `stokehold.largestFile`. */
const LEAST_MEGABYTES = 0.01;
const MOST_MEGABYTES = 16;

/** The settings in what a client answers for the section `stokehold`. */
export function asSettings(answer: unknown): Settings {
  if (typeof answer !== 'object' || answer === null) return DEFAULT_SETTINGS;
  const pause: unknown = 'pause' in answer ? answer.pause : undefined;
  const megabytes: unknown = 'largestFile' in answer ? answer.largestFile : undefined;
  const severity: unknown = 'severity' in answer ? answer.severity : undefined;
  return {
    pauseMs: within(pause, 0, LONGEST_PAUSE_MS) ?? DEFAULT_SETTINGS.pauseMs,
    largestText: Math.round(
      (within(megabytes, LEAST_MEGABYTES, MOST_MEGABYTES) ?? DEFAULT_SETTINGS.largestText / CHARACTERS_PER_MEGABYTE) *
        CHARACTERS_PER_MEGABYTE,
    ),
    severities: new Map(
      Object.entries(typeof severity === 'object' && severity !== null ? severity : {}).filter(isChoice),
    ),
  };
}

/** The number, no less and no more than it may be; undefined when it is none. */
function within(value: unknown, least: number, most: number): number | undefined {
  return typeof value === 'number' && Number.isFinite(value) ? Math.min(Math.max(least, value), most) : undefined;
}

function isChoice(entry: [string, unknown]): entry is [string, Severity | 'off'] {
  return CHOICES.has(entry[1]);
}

const CHOICES: ReadonlySet<unknown> = new Set<Severity | 'off'>(['error', 'warning', 'information', 'hint', 'off']);
