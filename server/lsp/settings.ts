// The person's settings, `stokehold.*`, as the server uses them. Whatever a client sends is checked here, and what makes no
// sense counts as not set. Knows no connection. Invariant: every setting has a value, whatever was sent.
import type { Severity } from '../findings/finding.ts';
import type { SeverityChoices } from '../features/diagnostics.ts';

export interface Settings {
  /** `stokehold.pause`: how long nothing must be typed before a document is worked out, in milliseconds. */
  readonly pauseMs: number;
  /** `stokehold.severity`: a lower severity, or `off`, for single finding codes. */
  readonly severities: SeverityChoices;
}

export const DEFAULT_SETTINGS: Settings = { pauseMs: 100, severities: new Map() };

const LONGEST_PAUSE_MS = 10_000;

/** The settings in what a client answers for the section `stokehold`. */
export function asSettings(answer: unknown): Settings {
  if (typeof answer !== 'object' || answer === null) return DEFAULT_SETTINGS;
  const pause: unknown = 'pause' in answer ? answer.pause : undefined;
  const severity: unknown = 'severity' in answer ? answer.severity : undefined;
  return {
    pauseMs:
      typeof pause === 'number' && Number.isFinite(pause)
        ? Math.min(Math.max(0, pause), LONGEST_PAUSE_MS)
        : DEFAULT_SETTINGS.pauseMs,
    severities: new Map(
      Object.entries(typeof severity === 'object' && severity !== null ? severity : {}).filter(isChoice),
    ),
  };
}

function isChoice(entry: [string, unknown]): entry is [string, Severity | 'off'] {
  return CHOICES.has(entry[1]);
}

const CHOICES: ReadonlySet<unknown> = new Set<Severity | 'off'>(['error', 'warning', 'information', 'hint', 'off']);
