// Walks an expression: each of its parts once, itself first, in the order of the text. Iterative, since chains of operators
// and arguments are as long as the grammar allows. Knows nothing of what the parts mean.

import type { Expression } from './tree.ts';

/** The expression and all expressions in it. */
export function* expressionsIn(expression: Expression | undefined): Iterable<Expression> {
  const rest = expression ? [expression] : [];
  for (let item = rest.pop(); item; item = rest.pop()) {
    yield item;
    pushPartsOf(item, rest);
  }
}

/** Puts the direct parts on the stack, the last first. */
function pushPartsOf(item: Expression, stack: Expression[]): void {
  switch (item.kind) {
    case 'reference':
      if (item.at) stack.push(item.at);
      break;
    case 'call':
      for (let index = item.arguments.length - 1; index >= 0; index--) {
        const argument = item.arguments[index];
        if (argument) stack.push(argument);
      }
      break;
    case 'bracket':
      if (item.inner) stack.push(item.inner);
      break;
    case 'unary':
      stack.push(item.operand);
      break;
    case 'binary':
    case 'comparison':
      stack.push(item.right, item.left);
      break;
    case 'within':
      stack.push(item.target, item.left);
      break;
    case 'quantity':
    case 'word':
    case 'text':
    case 'membership':
    case 'lone-unit':
  }
}
