/**
 * An equation that does not balance: some element has more atoms on one side than on the other. The deficit of each is
 * given; where coefficients exist that balance it, the balanced equation is offered as a quick fix. Where there is more
 * than one independent way, that is said and the simplest is offered.
 */
import { formulaTextWithPhase, type Formula } from '../core/substance/formula.ts';
import { formatNumber } from '../wording/numbers.ts';
import { listed, quoted, sentences } from '../wording/words.ts';
import { placeOf, sectionAt } from '../scenario/place.ts';
import type { Place } from '../scenario/scenario.ts';
import { textAt, type FactOf, type Rule, type Site } from './rule.ts';

type Unbalanced = FactOf<'balance/elements'>;
type NoBalance = Extract<Unbalanced['solution'], { readonly kind: 'none' }>['why'];

const MOST_ELEMENTS = 4;

export const balanceElements: Rule<Unbalanced> = {
  severity: 'error',
  messageAt: (fact, site) => {
    const ion = ionMeant(site);
    const hint =
      ion &&
      `${quoted(ion.written)} reads as ${ion.count} atoms with a single charge; the ion is written ${quoted(ion.meant)}.`;
    return sentences('The equation is not balanced.', deficits(fact), hint ?? way(fact));
  },
  fixes: ({ solution }, site) => {
    const ion = ionMeant(site);
    if (ion) {
      const newText = textAt({ ...site, place: equationAround(site) }).replaceAll(ion.written, ion.meant);
      return [{ title: `Write \`${ion.meant}\``, preferred: true, edits: [{ place: equationAround(site), newText }] }];
    }
    if (solution.kind === 'none') return [];
    const title =
      solution.kind === 'unique' ? `Balance: ${solution.equation}` : `Balance the simplest way: ${solution.equation}`;
    return [
      {
        title,
        preferred: solution.kind === 'unique',
        edits: [{ place: equationAround(site), newText: solution.equation }],
      },
    ];
  },
};

/** `CO32-`, as ions are printed with raised charges: read as it stands it has 32 oxygen atoms. */
function ionMeant(
  site: Site,
): { readonly written: string; readonly meant: string; readonly count: string } | undefined {
  const text = textAt({ ...site, place: equationAround(site) });
  const [written, formula = '', atoms = '', charge = '', sign = ''] =
    /\b([A-Z][A-Za-z0-9()]*?)(\d)([2-4])([+-])(?=[\s,;)]|$)/.exec(text) ?? [];
  if (written === undefined || Number(atoms) < 2) return undefined;
  return { written, meant: `${formula}${atoms}^${charge}${sign}`, count: `${atoms}${charge}` };
}

function deficits({ differences }: Unbalanced): string {
  const said = differences
    .slice(0, MOST_ELEMENTS)
    .map(
      ({ element, left, right }) =>
        `${element}: ${formatNumber(left)} on the left, ${formatNumber(right)} on the right`,
    );
  const more = differences.length - said.length;
  if (said.length === 0) return '';
  return `${said.join('; ')}${more > 0 ? `; and ${more} more` : ''}.`;
}

function way({ solution }: Unbalanced): string {
  switch (solution.kind) {
    case 'unique':
      return `Balanced it reads ${whole(solution.equation)}.`;
    case 'several':
      return `There are ${solution.freedom} independent ways to balance it; the simplest is ${whole(solution.equation)}.`;
    case 'none':
      return `No coefficients balance it: ${reason(solution.why)}.`;
  }
}

/** The equation in full: on the command line the message is the only offer there is. */
const whole = (equation: string): string => `\`${equation.replace(/\s+/g, ' ')}\``;

function reason(why: NoBalance): string {
  switch (why.reason) {
    case 'empty-side':
      return `there is nothing on the ${why.side}`;
    case 'one-sided':
      return listed(why.elements.map(({ element, side }) => `${element} stands on the ${side} only`));
    case 'wrong-side':
      return `${species(why.species)} would have to stand on the other side`;
    case 'takes-no-part':
      return `${species(why.species)} can take no part in it`;
    case 'conflict':
      return `the amounts of ${listed(why.elements)} cannot be met together`;
    case 'too-large':
      return 'they would be too large to be meant';
  }
}

function species(places: readonly { readonly formula: Formula }[]): string {
  return listed(places.map(({ formula }) => quoted(formulaTextWithPhase(formula))));
}

/** The whole equation, though the finding may stand at a part of it. */
function equationAround({ place, file }: Site): Place {
  const placed = sectionAt(file.tree, place.start);
  if (placed?.section.statement.kind !== 'definition') return place;
  const equations = placed.section.statement.lines
    .filter((line) => line.kind === 'equation')
    .map((line) => placeOf(place.path, placed, line.span));
  return equations.find((equation) => equation.start <= place.start && place.end <= equation.end) ?? place;
}
