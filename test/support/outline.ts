// Renders parts of the syntax tree in one short line each, so that tests can compare a reading at a glance. Shows the
// structure (brackets around every operation) and what each operand was read as; spans are checked elsewhere.
import type {
  BrokenStatement,
  Expression,
  Line,
  NumberLiteral,
  PhraseItem,
  Section,
  Term,
  UnitWords,
  Word,
} from '../../grammar/tree.ts';

export function outlineExpression(node: Expression): string {
  switch (node.kind) {
    case 'quantity': {
      const spread = node.uncertainty;
      const behind = spread === undefined ? '' : `±${number(spread.number)}${unit(spread.unit)}`;
      return `${number(node.number)}${unit(node.unit)}${behind}`;
    }
    case 'word':
      return word(node);
    case 'text':
      return `"${node.value}"${node.closed ? '' : '…'}`;
    case 'reference': {
      const row = node.row === undefined ? '' : `${word(node.row)} in `;
      const at = node.at === undefined ? '' : ` at ${outlineExpression(node.at)}`;
      return `<${node.words} of ${row}${node.name === undefined ? '?' : word(node.name)}${at}>`;
    }
    case 'membership': {
      const basis = node.basis === undefined ? '' : ` by ${node.basis.basis}`;
      return `<${word(node.substance)} in ${node.name === undefined ? '?' : word(node.name)}${basis}>`;
    }
    case 'call':
      return `${node.name.text}(${node.arguments.map(outlineExpression).join(', ')})`;
    case 'bracket':
      return `(${node.inner === undefined ? '' : outlineExpression(node.inner)})`;
    case 'unary':
      return `{-${outlineExpression(node.operand)}}`;
    case 'binary':
    case 'comparison':
      return `{${outlineExpression(node.left)} ${node.operator} ${outlineExpression(node.right)}}`;
    case 'within': {
      const spread = node.tolerance;
      const tolerance = spread === undefined ? '' : ` ±± ${number(spread.number)}${unit(spread.unit)}`;
      return `{${outlineExpression(node.left)} within ${outlineExpression(node.target)}${tolerance}}`;
    }
    case 'lone-unit':
      return `unit${unit(node.unit)}`;
  }
}

export function outlineLine(line: Line): string {
  switch (line.kind) {
    case 'entry':
      return `${line.words}: ${line.phrases.map((phrase) => phrase.items.map(outlineItem).join(' ')).join(', ')}`;
    case 'portion': {
      const amount = line.amount.kind === 'rest' ? 'rest' : outlineExpression(line.amount);
      const basis = line.basis === undefined ? '' : ` by ${line.basis.basis}`;
      return `portion ${amount}${basis} of ${line.substance === undefined ? '?' : word(line.substance)}`;
    }
    case 'equation':
      return `${line.left.map(term).join(' + ')} -> ${line.right.map(term).join(' + ')}`;
    case 'acknowledge':
      return `acknowledge ${line.code?.text ?? '?'} "${line.reason?.value ?? '?'}"`;
    case 'broken-line':
      return line.words === undefined ? 'broken' : `broken ${line.words}`;
  }
}

export function outlineSection({ statement, doc }: Section): string {
  const documented = doc === '' ? '' : `[${doc}] `;
  switch (statement.kind) {
    case 'title':
      return `${documented}scenario ${statement.title?.value ?? '?'}`;
    case 'use':
      return `${documented}use ${statement.path?.value ?? '?'}`;
    case 'let': {
      const name = statement.name === undefined ? '?' : word(statement.name);
      return `${documented}let ${name} = ${statement.value === undefined ? '?' : outlineExpression(statement.value)}`;
    }
    case 'expect':
      return `${documented}expect ${statement.claim === undefined ? '?' : outlineExpression(statement.claim)}`;
    case 'definition': {
      const name = statement.name === undefined ? '?' : word(statement.name);
      const lines = statement.lines.map(outlineLine).join('; ');
      return `${documented}${statement.keyword.text} ${name} {${lines}${statement.closed ? '}' : '…'}`;
    }
    case 'broken':
      return `${documented}${broken(statement)}`;
  }
}

const broken = ({ name }: BrokenStatement): string => (name === undefined ? 'broken' : `broken ${word(name)}`);

const outlineItem = (item: PhraseItem): string =>
  item.kind === 'connective' ? `|${item.word}|` : outlineExpression(item);

function term({ coefficient, species }: Term): string {
  return coefficient === undefined ? word(species) : `${number(coefficient)} ${word(species)}`;
}

const number = ({ value, fraction }: NumberLiteral): string =>
  fraction === undefined ? String(value) : `${fraction[0]}/${fraction[1]}`;

/** Names stand as they are; quoted names, formulas and open words are marked `'`, `f'` and `?`. */
function word({ text, form, phase }: Word): string {
  const attached = phase === undefined ? '' : `(${phase})`;
  switch (form) {
    case 'name':
      return text;
    case 'quoted':
      return `'${text}'`;
    case 'formula':
      return `f'${text}${attached}'`;
    case 'open':
      return `${text}?`;
  }
}

function unit(words: UnitWords | undefined): string {
  if (words === undefined) return '';
  const parts = words.tokens.map(({ kind, text, power }) => {
    const written = power === 1 ? '' : `^${power}`;
    switch (kind) {
      case 'word':
        return `${text}${written}`;
      case 'times':
        return '*';
      case 'over':
        return '/';
      case 'open':
        return '(';
      case 'close':
        return `)${written}`;
    }
  });
  return `[${parts.join('')}]`;
}
