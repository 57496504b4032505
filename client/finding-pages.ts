// Links every finding's code to what the reference says of it: the page of hazards for a hazard, the page of findings for
// the rest, both shown from the installed extension, so that they open without a network.
// Knows no code: a page's heading is the code itself. Invariant: a finding keeps its code's text. Source of the headings'
// addresses: the slugs of VS Code's Markdown preview (lower case, marks dropped, blanks to hyphens).
import {
  commands,
  Position,
  Range,
  Selection,
  TextEditorRevealType,
  Uri,
  window,
  workspace,
  type Diagnostic,
  type Disposable,
} from 'vscode';
import type { Middleware } from 'vscode-languageclient/node';

const SHOW_PAGE = 'stokehold.showFindingPage';

/** Puts the link behind each finding's code as it comes in. */
export function linkingCodes(): Middleware {
  return {
    handleDiagnostics: (uri, diagnostics, next) => {
      for (const diagnostic of diagnostics) {
        if (typeof diagnostic.code === 'string') diagnostic.code = linked(diagnostic.code);
      }
      next(uri, diagnostics);
    },
  };
}

function linked(code: string): NonNullable<Diagnostic['code']> {
  const target = Uri.from({ scheme: 'command', path: SHOW_PAGE, query: JSON.stringify([code]) });
  return { value: code, target };
}

/** The command behind the links; `extension` is where the extension is installed. */
export function registerFindingPages(extension: Uri): Disposable {
  return commands.registerCommand(SHOW_PAGE, async (code: unknown) => {
    const text = typeof code === 'string' ? code : '';
    const page = Uri.joinPath(extension, 'examples', 'reference', pageOf(text));
    const known = await commands.getCommands(true);
    if (known.includes(SHOW_PREVIEW)) {
      await commands.executeCommand(SHOW_PREVIEW, page.with({ fragment: headingOf(text) }));
    } else await showText(page, text);
  });
}

const SHOW_PREVIEW = 'markdown.showPreview';

/** An editor without the preview shows the page's text, from the code's heading on. */
async function showText(page: Uri, code: string): Promise<void> {
  const document = await workspace.openTextDocument(page);
  const lines = document.getText().split(/\r?\n/);
  const heading = lines.findIndex((line) => line.startsWith('## ') && line.replaceAll('`', '') === `## ${code}`);
  const editor = await window.showTextDocument(document);
  const start = new Position(Math.max(0, heading), 0);
  editor.selection = new Selection(start, start);
  editor.revealRange(new Range(start, start), TextEditorRevealType.AtTop);
}

function pageOf(code: string): string {
  return code.startsWith('hazard/') ? 'hazards.md' : 'codes.md';
}

function headingOf(code: string): string {
  return code.replaceAll('/', '');
}
