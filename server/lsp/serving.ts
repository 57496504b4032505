// What every group of requests is handed: the connection to answer on, and where to find documents, evaluations, what the
// client can do and what the person has set. Knows no request.
import type { Connection } from 'vscode-languageserver';
import type { Abilities } from './abilities.ts';
import type { OpenDocuments } from './documents.ts';
import type { TextDocument } from 'vscode-languageserver-textdocument';
import type { Reading } from '../scenario/files.ts';
import type { Evaluations } from './evaluations.ts';
import type { Settings } from './settings.ts';
import type { ViewedWork } from './viewed-work.ts';

export interface Serving {
  readonly connection: Connection;
  readonly documents: OpenDocuments;
  readonly evaluations: Evaluations;
  readonly viewedWork: ViewedWork;
  readonly abilities: () => Abilities;
  readonly settings: () => Settings;
  /** How an open document is to be read: whole, or what is seen of it. */
  readonly readingOf: (document: TextDocument) => Reading;
  readonly log: (message: string) => void;
}
