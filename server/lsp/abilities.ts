// What the client said it can do, read from the first request. Nothing in that request is trusted to be there: whatever is
// missing or misshapen counts as "cannot". Knows no connection.
// Source: Language Server Protocol 3.18, "Client Capabilities".
import { addressOf } from './addresses.ts';

export interface Abilities {
  /** Shows hovers written in Markdown. */
  readonly markdown: boolean;
  /** What it takes of a completion. */
  readonly completion: CompletionAbilities;
  /** Takes an outline as a tree with details, not only as a flat list. */
  readonly outlineTree: boolean;
  /** Shows places related to a finding. */
  readonly related: boolean;
  /** Takes quick fixes as edits, not only as commands. */
  readonly codeActions: boolean;
  /** Asks what would be renamed before it asks for the new name. */
  readonly prepareRename: boolean;
  /** Colours by meaning. */
  readonly semanticTokens: boolean;
  /** Takes edits that name the version they belong to. */
  readonly versionedEdits: boolean;
  /** Answers questions for settings. */
  readonly configuration: boolean;
  readonly configurationNews: boolean;
  /** Tells of changed files once asked to. */
  readonly watching: boolean;
  readonly folderNews: boolean;
  /** Answers `stokehold/readFile`, as it said in the initialization options. */
  readonly readFile: boolean;
  /** Addresses of the workspace's folders at the start. */
  readonly folders: readonly string[];
}

export interface CompletionAbilities {
  readonly snippets: boolean;
  /** Takes two ranges: to insert, and to replace the rest of the word too. */
  readonly insertReplace: boolean;
  readonly labelDetails: boolean;
  readonly markdown: boolean;
  /** Takes the range of most items once, with the list. */
  readonly defaultRange: boolean;
  /** The command of the client that opens the list again, as it said in the initialization options. */
  readonly suggestCommand: string | null;
}

/** @param params what came with `initialize`, whatever its shape. */
export function abilitiesOf(params: unknown): Abilities {
  const has = (...keys: string[]): boolean => at(params, 'capabilities', ...keys) === true;
  const list = (...keys: string[]): readonly unknown[] => {
    const found = at(params, 'capabilities', ...keys);
    return Array.isArray(found) ? found : [];
  };
  const command = at(params, 'initializationOptions', 'suggestCommand');
  return {
    markdown: list('textDocument', 'hover', 'contentFormat').includes('markdown'),
    completion: {
      snippets: has('textDocument', 'completion', 'completionItem', 'snippetSupport'),
      insertReplace: has('textDocument', 'completion', 'completionItem', 'insertReplaceSupport'),
      labelDetails: has('textDocument', 'completion', 'completionItem', 'labelDetailsSupport'),
      markdown: list('textDocument', 'completion', 'completionItem', 'documentationFormat').includes('markdown'),
      defaultRange: list('textDocument', 'completion', 'completionList', 'itemDefaults').includes('editRange'),
      suggestCommand: typeof command === 'string' ? command : null,
    },
    outlineTree: has('textDocument', 'documentSymbol', 'hierarchicalDocumentSymbolSupport'),
    related: has('textDocument', 'publishDiagnostics', 'relatedInformation'),
    codeActions: at(params, 'capabilities', 'textDocument', 'codeAction', 'codeActionLiteralSupport') !== undefined,
    prepareRename: has('textDocument', 'rename', 'prepareSupport'),
    semanticTokens: at(params, 'capabilities', 'textDocument', 'semanticTokens') !== undefined,
    versionedEdits: has('workspace', 'workspaceEdit', 'documentChanges'),
    configuration: has('workspace', 'configuration'),
    configurationNews: has('workspace', 'didChangeConfiguration', 'dynamicRegistration'),
    watching: has('workspace', 'didChangeWatchedFiles', 'dynamicRegistration'),
    folderNews: has('workspace', 'workspaceFolders'),
    readFile: at(params, 'initializationOptions', 'readFile') === true,
    folders: foldersOf(params),
  };
}

/** The addresses in a list of workspace folders; what is no folder is left out. */
export function folderAddresses(folders: unknown): readonly string[] {
  if (!Array.isArray(folders)) return [];
  return folders
    .map((folder) => at(folder, 'uri'))
    .filter((uri) => typeof uri === 'string')
    .map(addressOf);
}

function foldersOf(params: unknown): readonly string[] {
  const folders = at(params, 'workspaceFolders');
  if (Array.isArray(folders)) return folderAddresses(folders);
  const root = at(params, 'rootUri'); // how older clients say it
  return typeof root === 'string' ? [addressOf(root)] : [];
}

function at(value: unknown, ...keys: string[]): unknown {
  let found = value;
  for (const key of keys) {
    if (typeof found !== 'object' || found === null || !Object.hasOwn(found, key)) return undefined;
    found = Reflect.get(found, key);
  }
  return found;
}
