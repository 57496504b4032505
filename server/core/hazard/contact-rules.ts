// What a blend does to the walls, pipes and seals that hold it, and what stands ready to put its fire out does to it.
// Knows no strength and no rate of corrosion: only what makes gas, fire or cracks. Invariant: without a word on walls and
// agents nothing here speaks.

import { isOxidiser } from './alone-rules.ts';
import { isSharpAcid } from './meeting-rules.ts';
import { ruleSources } from './rule.ts';
import type { HazardRule, Hit } from './rule.ts';
import { holdsWater, isIn } from './store.ts';
import type { ContactMaterial, Store, StoredPortion } from './store.ts';
import type { HazardSeverity } from './hazard-codes.ts';

type Judge = (portion: StoredPortion, material: ContactMaterial, store: Store) => HazardSeverity | null;

function eachContact(store: Store, judge: Judge): readonly Hit[] {
  return store.portions.flatMap((portion, index) =>
    store.contact.flatMap((material): Hit[] => {
      const severity = judge(portion, material, store);
      if (severity === null) return [];
      return [{ severity, portion: index, partner: { kind: 'contact', material }, numbers: {} }];
    }),
  );
}

const copperAlloys: readonly ContactMaterial[] = ['copper', 'brass', 'bronze'];
const amphoteric: readonly ContactMaterial[] = ['aluminium', 'zinc', 'galvanised-steel'];
const baseMetals: readonly ContactMaterial[] = ['steel', 'cast-iron', 'magnesium', ...amphoteric];
/** The metals of walls that dry chlorine leaves alone when cool; above 120 °C iron burns in it. */
const chlorineProof: readonly ContactMaterial[] = ['steel', 'stainless-steel', 'cast-iron', 'copper', 'ptfe', 'lead'];
const ironBurnsInChlorineK = 393;

export const contactRules: readonly HazardRule[] = [
  {
    id: 'caustic-in-vessel',
    code: 'hazard/metal-and-caustic',
    happens: 'Caustic dissolves the wall and hydrogen comes off.',
    mend: 'Use steel or a plastic that stands caustic; no galvanised or aluminium parts.',
    source: ruleSources.bretherick,
    find: (store) =>
      eachContact(store, (portion, material) =>
        isIn(portion, 'caustic') && holdsWater(store) && amphoteric.includes(material) ? 'error' : null,
      ),
  },
  {
    id: 'acid-in-vessel',
    code: 'hazard/metal-and-acid',
    happens: 'The acid dissolves the wall and hydrogen comes off.',
    mend: 'Use a lining or an alloy that stands this acid at this strength.',
    source: ruleSources.practice,
    find: (store) =>
      eachContact(store, (portion, material) => {
        if (!isIn(portion, 'mineral-acid') || !isSharpAcid(portion)) return null;
        // Hydrochloric and hydrofluoric acid break the film of stainless steel too.
        const isHalide = !portion.molPerKg.has('O') && material === 'stainless-steel';
        if (!isHalide && !baseMetals.includes(material)) return null;
        return isPassivating(portion, material, store) ? null : 'error';
      }),
  },
  {
    id: 'halogen-in-vessel',
    code: 'hazard/metal-and-halogen',
    happens: 'The wall takes fire in the halogen.',
    mend: 'Dry chlorine belongs in steel, wet chlorine in titanium.',
    source: ruleSources.bretherick,
    find: (store) =>
      eachContact(store, (portion, material) => {
        if (!isIn(portion, 'halogen')) return null;
        if (material === 'titanium' && holdsWater(store)) return null;
        const isProof = chlorineProof.includes(material) && store.temperatureK < ironBurnsInChlorineK;
        return isProof ? null : 'error';
      }),
  },
  {
    id: 'alkali-metal-on-fluoropolymer',
    code: 'hazard/metal-and-halogen',
    happens: 'The metal strips fluorine from the seal, a melt with much heat.',
    mend: 'Use metal or graphite seals.',
    source: ruleSources.bretherick,
    find: (store) =>
      eachContact(store, (portion, material) => {
        if (!isIn(portion, 'alkali-metal') || material !== 'ptfe') return null;
        return portion.phase === 'liquid' ? 'error' : 'warning';
      }),
  },
  {
    id: 'ammonia-in-vessel',
    code: 'hazard/ammonia-and-copper',
    happens:
      'Ammonia corrodes and cracks copper, zinc and their alloys; with mercury and silver it leaves explosive deposits.',
    mend: 'Use steel without copper, zinc or mercury anywhere it reaches.',
    source: ruleSources.igc,
    find: (store) =>
      eachContact(store, (portion, material) => {
        if (!isIn(portion, 'ammonia')) return null;
        if (material === 'mercury' || material === 'silver') return 'error';
        return [...copperAlloys, 'zinc', 'galvanised-steel'].includes(material) ? 'warning' : null;
      }),
  },
  {
    id: 'acetylene-in-vessel',
    code: 'hazard/acetylide',
    happens: 'Acetylides form on the wall and explode when dry.',
    mend: 'No copper, silver or mercury, and no alloy with more than 65 % copper.',
    source: ruleSources.bretherick,
    find: (store) =>
      eachContact(store, (portion, material) =>
        isIn(portion, 'acetylene') && [...copperAlloys, 'silver', 'mercury'].includes(material) ? 'error' : null,
      ),
  },
  {
    id: 'wrong-agent',
    code: 'hazard/extinguishing',
    happens: 'This agent feeds or spreads its fire.',
    mend: 'Keep ready the agent its safety data sheet names.',
    source: ruleSources.practice,
    find: (store) =>
      store.portions.flatMap(({ hazards }, index) =>
        store.extinguishing
          .filter((agent) => hazards.extinguishing?.wrong.includes(agent) === true)
          .map((agent): Hit => ({
            severity: 'warning',
            portion: index,
            partner: { kind: 'agent', agent },
            numbers: {},
          })),
      ),
  },
];

/** Strong sulphuric acid coats iron, strong nitric acid aluminium. */
function isPassivating(portion: StoredPortion, material: ContactMaterial, store: Store): boolean {
  const water = store.portions.reduce((sum, other) => sum + (isIn(other, 'water') ? other.massShare : 0), 0);
  const strength = portion.massShare / (portion.massShare + water);
  const isIron = material === 'steel' || material === 'cast-iron';
  if (portion.molPerKg.has('S')) return isIron && strength >= 0.9;
  return isOxidiser(portion) && material === 'aluminium' && strength >= 0.8;
}
