// Puts a scenario's text into a file of the open folder and shows it. Knows nothing of what is expected of it.
// Invariant: each call makes a file of its own, so no test sees another's findings.
import * as vscode from 'vscode';

let written = 0;

/** Writes the text to a new file of the open folder, shows it and returns its document. */
export async function openScenario(text: string): Promise<vscode.TextDocument> {
  const folder = vscode.workspace.workspaceFolders?.[0];
  if (folder === undefined) throw new Error('no folder is open');
  written += 1;
  const uri = vscode.Uri.joinPath(folder.uri, `in-host-${written}.stoke`);
  await vscode.workspace.fs.writeFile(uri, Buffer.from(text));
  const document = await vscode.workspace.openTextDocument(uri);
  await vscode.window.showTextDocument(document);
  return document;
}
