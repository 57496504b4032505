// What can be folded, on small files.
import { describe, it } from 'vitest';
import { checkFolding } from '../../support/navigation.ts';

describe('folds', () => {
  it.each<[what: string, text: string, folds: string[]]>([
    ['a definition, from its header', '## doc\nblend f {\n  rest methanol\n}\n', ['definition 2-4']],
    ['a definition without its brace', 'blend f {\n  rest methanol\n\nlet a = 1\n', ['definition 1-2']],
    ['a run of comments', '# a\n# b\n\n# c\nlet a = 1\n', ['comment 1-2']],
    ['comments inside a definition', 'blend f {\n  # a\n  # b\n}\n', ['definition 1-4', 'comment 2-3']],
    ['a run of `use`', 'use "a"\nuse "b"\nlet a = 1\n', ['imports 1-2']],
    ['regions, also in each other', '# region a\n# region b\n# endregion\n# endregion\n', ['region 1-4', 'region 2-3']],
    ['nothing on one line', 'blend f { rest methanol }\n# a\n', []],
    ['with CR LF', 'blend f {\r\n  rest methanol\r\n}\r\n', ['definition 1-3']],
    ['two definitions', 'sea a {\n}\n\nsea b {\n}\n', ['definition 1-2', 'definition 4-5']],
    ['nothing in an empty file', '', []],
  ])('%s', (_, text, folds) => {
    checkFolding(text, folds);
  });
});
