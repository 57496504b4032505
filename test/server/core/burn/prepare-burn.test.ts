// Burns from charge to states: what is conserved, what is held, how temperatures move, and that nothing depends on the order
// in which states are looked at.

import { describe, expect, test } from 'vitest';
import { heatingValueOfFuel } from '../../../../server/core/balance/heating-value.ts';
import type { BurnInput, BurnState, BurnStream } from '../../../../server/core/burn/burn.ts';
import { prepareBurn } from '../../../../server/core/burn/prepare-burn.ts';
import { amountOf, peakGases } from '../../../../server/core/burn/products.ts';
import { atomGap, burn, formulaOf, mixed, plainAir, solved, stream } from './streams.ts';

const methane = stream('methane');
const slurry = mixed(
  [0.28, stream('sodium')],
  [0.69, stream('gas_oil')],
  [0.02, stream('NaCl')],
  [0.01, stream('sulfur')],
);

function heatingValue(fuel: BurnStream): { lower: number; higher: number } {
  const value = heatingValueOfFuel(fuel.elementMolPerKg, fuel.enthalpyJPerKg ?? Number.NaN, 'as-ruled');
  if (value.kind === 'fault') throw new Error(value.reason);
  return { lower: value.lowerJPerKg, higher: value.higherJPerKg };
}

function flameK(fuel: BurnStream, more: Partial<BurnInput> = {}): number {
  return solved(burn(fuel, more).flame()).temperatureK;
}

describe('what is conserved', () => {
  const slurryBurn = burn(slurry, {
    amount: { by: 'lambda', lambda: 2.1 },
    zone: { by: 'lambda', lambda: 1 },
    cooledToK: [1173, 623, 350],
    frozenBelowK: 423,
  });

  test('atoms, in every state', () => {
    const { charge, zoneCharge } = slurryBurn;
    const states: BurnState[] = [
      solved(slurryBurn.flame()),
      ...slurryBurn.cooled.map(({ state }) => solved(state())),
      ...slurryBurn.path([1700, 1200, 900, 500, 400, 300]).states.map((state) => solved(state)),
    ];
    for (const state of states) {
      expect(atomGap(state, charge.elements, charge.elementMol)).toBeLessThan(1e-9);
      expect(state.massKg / charge.massKg).toBeCloseTo(1, 5);
    }
    if (zoneCharge === null) throw new Error();
    expect(atomGap(solved(slurryBurn.zone()), zoneCharge.elements, zoneCharge.elementMol)).toBeLessThan(1e-9);
  });

  test('enthalpy, at held pressure', () => {
    const { charge } = slurryBurn;
    expect(solved(slurryBurn.flame()).enthalpyJ / (charge.enthalpyJ ?? 0)).toBeCloseTo(1, 8);
    expect(solved(slurryBurn.zone()).enthalpyJ / (slurryBurn.zoneCharge?.enthalpyJ ?? 0)).toBeCloseTo(1, 8);
  });

  test('energy, in a held volume', () => {
    const closed = burn(methane, { held: { held: 'volume', chargePressurePa: 1e5 } });
    const state = solved(closed.flame());
    const energy = state.enthalpyJ - state.pressurePa * state.volumeM3;
    const before = (closed.charge.enthalpyJ ?? Number.NaN) - closed.charge.pressureVolumeJ;
    expect((energy - before) / 5e7).toBeCloseTo(0, 8);
    expect(state.volumeM3).toBeCloseTo(closed.charge.volumeM3, 9);
    expect(state.pressurePa).toBeGreaterThan(8e5);
  });

  test('a loss takes its share of the lower heating value', () => {
    const { lower } = heatingValue(methane);
    const lossy = burn(methane, { heat: { heat: 'adiabatic', lossShare: 0.14 }, lowerHeatingValueJPerKg: lower });
    const lost = (lossy.charge.enthalpyJ ?? Number.NaN) - solved(lossy.flame()).enthalpyJ;
    expect(lost / (0.14 * lower)).toBeCloseTo(1, 8);
  });
});

describe('how hot', () => {
  test('preheat and oxygen raise the flame, excess air and water lower it', () => {
    const preheats = [298.15, 400, 600, 800, 1000].map((airK) => flameK(methane, { oxidant: plainAir(airK) }));
    expect([...preheats].sort((a, b) => a - b)).toEqual(preheats);
    const excess = [1, 1.2, 1.6, 2.2, 3].map((lambda) => flameK(methane, { amount: { by: 'lambda', lambda } }));
    expect([...excess].sort((a, b) => b - a)).toEqual(excess);
    const enriched = mixed([0.8, plainAir()], [0.2, stream('oxygen')]);
    expect(flameK(methane, { oxidant: enriched })).toBeGreaterThan(flameK(methane) + 200);
  });

  test('the hottest flame is a little rich', () => {
    const at = (lambda: number): number => flameK(methane, { amount: { by: 'lambda', lambda } });
    expect(at(0.95)).toBeGreaterThan(at(1));
    expect(at(0.95)).toBeGreaterThan(at(0.8));
  });

  test('pressure holds dissociation down', () => {
    expect(flameK(methane, { held: { held: 'pressure', pressurePa: 1e7 } })).toBeGreaterThan(flameK(methane) + 30);
  });

  test('a given temperature is that temperature, with or without an energy of the fuel', () => {
    const blind = { ...methane, enthalpyJPerKg: null, referenceEnthalpyJPerKg: null };
    const given = burn(blind, { heat: { heat: 'temperature', temperatureK: 1800 } });
    expect(solved(given.flame()).temperatureK).toBe(1800);
    expect(given.heat()).toBeNull();
    expect(given.heatAbove(500)).toBeNull();
  });

  test('λ moves carbon monoxide and oxygen apart', () => {
    const states = [0.7, 0.85, 1, 1.2, 1.5].map((lambda) =>
      solved(burn(methane, { amount: { by: 'lambda', lambda } }).flame()),
    );
    const carbonMonoxide = states.map((state) => amountOf(state, 'CO(g)'));
    const oxygen = states.map((state) => amountOf(state, 'O2(g)'));
    expect([...carbonMonoxide].sort((a, b) => b - a)).toEqual(carbonMonoxide);
    expect([...oxygen].sort((a, b) => a - b)).toEqual(oxygen);
  });
});

describe('a zone that burns first', () => {
  const lean = { amount: { by: 'lambda', lambda: 2.1 } } as const;

  test('is hotter than the whole and leaves the whole as it is', () => {
    const staged = burn(methane, { ...lean, zone: { by: 'lambda', lambda: 1 } });
    const zone = solved(staged.zone());
    expect(zone.temperatureK).toBeGreaterThan(solved(staged.flame()).temperatureK + 500);
    expect(solved(staged.flame()).temperatureK).toBe(flameK(methane, lean));
    const [zoneNo] = peakGases(zone);
    const [flameNo] = peakGases(solved(staged.flame()));
    expect(zoneNo?.molPerKgFuel).toBeGreaterThan(flameNo?.molPerKgFuel ?? Number.NaN);
    expect(zoneNo?.wetMoleShare).toBeGreaterThan(2 * (flameNo?.wetMoleShare ?? Number.NaN));
  });

  test('at the λ of the whole it is the whole', () => {
    const staged = burn(methane, { ...lean, zone: lean.amount });
    expect(solved(staged.zone()).temperatureK).toBe(solved(staged.flame()).temperatureK);
  });

  test('without one there is none', () => {
    expect(burn(methane).zone()).toBeNull();
  });
});

describe('cooling', () => {
  test('from its temperature down the composition is frozen, and above it follows', () => {
    const frozen = burn(slurry, {
      amount: { by: 'lambda', lambda: 2.1 },
      frozenBelowK: 1000,
      cooledToK: [1200, 1000, 400],
    });
    const [live, at, cold] = frozen.cooled.map(({ state }) => solved(state()));
    const from = solved(frozen.frozenAt());
    expect(live?.kind).toBe('equilibrium');
    expect(at?.kind).toBe('frozen');
    expect(at?.enthalpyJ).toBeCloseTo(from.enthalpyJ, 3);
    const gas = (state: BurnState | undefined): number[] => [
      ...(state?.amountsMol.slice(0, from.candidates.gasCount) ?? []),
    ];
    expect(gas(cold)).toEqual(gas(from));
    expect(amountOf(from, 'NaOH(g)')).toBeGreaterThan(0);
    expect(solved(frozen.at(400))).toEqual(cold);
  });

  test('a flame cooler than the freezing temperature keeps its own composition', () => {
    const cool = burn(methane, { heat: { heat: 'temperature', temperatureK: 900 }, frozenBelowK: 1200 });
    expect(solved(cool.frozenAt()).temperatureK).toBe(900);
  });

  test('in a held volume the pressure falls; at its own pressure it does not', () => {
    const closed = { held: { held: 'volume', chargePressurePa: 1e5 }, cooledToK: [1000] } as const;
    const inside = solved(burn(methane, closed).cooled[0]?.state() ?? null);
    expect(inside.pressurePa / ((inside.gasMol * 8.31446261815324 * 1000) / inside.volumeM3)).toBeCloseTo(1, 9);
    const outside = solved(burn(methane, { ...closed, coolingPressurePa: 1e5 }).cooled[0]?.state() ?? null);
    expect(outside.pressurePa).toBe(1e5);
  });
});

describe('heat released', () => {
  const { lower, higher } = heatingValue(methane);
  const lean = { amount: { by: 'lambda', lambda: 1.3 }, lowerHeatingValueJPerKg: lower } as const;

  test('with the steam frozen in it is the lower heating value', () => {
    const heat = burn(methane, { ...lean, frozenBelowK: 450 }).heat();
    if (heat === null || 'reason' in heat) throw new Error();
    expect(heat.shareOfHeatingValue).toBeCloseTo(1, 3);
    expect(heat.preheatJ).toBeCloseTo(0, 6);
  });

  test('with the water condensing it comes near the higher one, and never reaches it', () => {
    const heat = burn(methane, lean).heat();
    if (heat === null || 'reason' in heat) throw new Error();
    expect(heat.releasedJ).toBeGreaterThan(lower + 0.7 * (higher - lower));
    expect(heat.releasedJ).toBeLessThan(higher);
  });

  test('preheat comes in and goes out', () => {
    const cold = burn(methane, { ...lean, frozenBelowK: 450 }).heat();
    const warm = burn(methane, { ...lean, frozenBelowK: 450, oxidant: plainAir(500) }).heat();
    if (cold === null || 'reason' in cold || warm === null || 'reason' in warm) throw new Error();
    expect(warm.preheatJ).toBeGreaterThan(1e6);
    expect(warm.releasedJ - cold.releasedJ).toBeCloseTo(warm.preheatJ ?? 0, 0);
    expect(warm.shareOfHeatingValue).toBeCloseTo(cold.shareOfHeatingValue ?? 0, 6);
  });

  test('above the flame nothing is released, above 25 °C all', () => {
    const once = burn(methane, lean);
    const heat = once.heat();
    if (heat === null || 'reason' in heat) throw new Error();
    expect(Number(once.heatAbove(solved(once.flame()).temperatureK)) / lower).toBeCloseTo(0, 7);
    expect(once.heatAbove(298.15)).toBeCloseTo(heat.releasedJ, 3);
    expect(once.heatAbove(600)).toBeLessThan(heat.releasedJ);
  });
});

describe('heats in a held volume are energies', () => {
  const closed = burn(methane, {
    held: { held: 'volume', chargePressurePa: 1e5 },
    lowerHeatingValueJPerKg: heatingValue(methane).lower,
  });

  test('above the flame nothing is given off', () => {
    expect(Number(closed.heatAbove(solved(closed.flame()).temperatureK)) / 5e7).toBeCloseTo(0, 6);
  });

  test('above a temperature with a loss taken out, the loss', () => {
    const lossShare = 0.2;
    const lossy = burn(methane, { ...closed.input, heat: { heat: 'adiabatic', lossShare } });
    const givenOff = Number(lossy.heatAbove(solved(lossy.flame()).temperatureK));
    expect(givenOff / (lossShare * heatingValue(methane).lower)).toBeCloseTo(1, 6);
  });

  test('down to 25 °C they are less than by enthalpies by R T for each mole of gas that is gone', () => {
    const heat = closed.heat();
    const open = burn(methane).heat();
    if (heat === null || 'reason' in heat || open === null || 'reason' in open) throw new Error();
    expect(closed.heatAbove(298.15)).toBeCloseTo(heat.releasedJ, 3);
    const goneMol = closed.charge.gasMol - heat.slate.gasMol;
    const byEnthalpiesJ = (closed.charge.enthalpyJ ?? Number.NaN) - heat.slate.enthalpyJ;
    expect(byEnthalpiesJ - heat.releasedJ).toBeCloseTo(goneMol * 8.31446261815324 * 298.15, 0);
    expect(heat.preheatJ).toBeCloseTo(0, 3);
  });

  test('preheat in a volume lacks the work of the gas', () => {
    const airK = 600;
    const warm = burn(methane, { ...closed.input, oxidant: plainAir(airK) });
    const heat = warm.heat();
    if (heat === null || 'reason' in heat) throw new Error();
    const { charge } = warm;
    const airMol = charge.gasMol - methane.gasMolPerKg;
    const byEnthalpiesJ = (charge.enthalpyJ ?? Number.NaN) - (charge.referenceEnthalpyJ ?? Number.NaN);
    expect(byEnthalpiesJ - (heat.preheatJ ?? Number.NaN)).toBeCloseTo(airMol * 8.31446261815324 * (airK - 298.15), 0);
  });

  test('cooling at a pressure is weighed by enthalpies', () => {
    const vented = burn(methane, { ...closed.input, coolingPressurePa: 1e5 });
    expect(vented.heatAbove(1000)).toBeCloseTo(Number(burn(methane).heatAbove(1000)), 0);
  });
});

describe('only what is asked, whatever was asked before', () => {
  test('a state is the same alone and after others', () => {
    const input = {
      amount: { by: 'lambda', lambda: 2.1 },
      cooledToK: [1173, 623],
      zone: { by: 'lambda', lambda: 1 },
    } as const;
    const alone = solved(burn(slurry, input).cooled[1]?.state() ?? null);
    const after = burn(slurry, input);
    after.path([1800, 1500, 1000, 700]);
    after.zone();
    expect(solved(after.cooled[1]?.state() ?? null)).toEqual(alone);
  });

  test('a burn that was given up solves nothing', () => {
    let asked = 0;
    const stopped = prepareBurn(burn(methane).input, () => {
      asked += 1;
      return true;
    });
    if (stopped.kind === 'fault') throw new Error();
    expect(asked).toBe(0);
    expect(stopped.flame()).toEqual({ kind: 'none', reason: 'stopped' });
    expect(stopped.path([1000, 900]).incomplete).toBe(true);
  });
});

describe('which products', () => {
  test('a barred one is in no state', () => {
    const barred = burn(methane, {
      amount: { by: 'lambda', lambda: 0.8 },
      barred: [formulaOf('CO')],
    });
    const state = solved(barred.flame());
    expect(state.candidates.phases.some(({ id }) => id === 'CO(g)')).toBe(false);
    expect(atomGap(state, barred.charge.elements, barred.charge.elementMol)).toBeLessThan(1e-9);
  });

  test('ions come with heat, and leave the whole neutral', () => {
    const potassium = mixed([0.3, stream('potassium')], [0.7, methane]);
    const hot = solved(burn(potassium, { ions: true }).flame());
    expect(hot.temperatureK).toBeGreaterThan(2000);
    expect(amountOf(hot, 'K+(g)')).toBeGreaterThan(1e-7);
    let charge = 0;
    hot.candidates.phases.forEach(({ formula }, phase) => (charge += formula.charge * (hot.amountsMol[phase] ?? 0)));
    expect(Math.abs(charge)).toBeLessThan(1e-9 * amountOf(hot, 'K+(g)') + 1e-18);
    const cool = solved(burn(potassium, { ions: true, amount: { by: 'lambda', lambda: 2.5 } }).flame());
    expect(cool.candidates.elements).not.toContain('charge');
  });
});

describe('no burn', () => {
  test.each<[string, Partial<BurnInput>, object]>([
    ['a zone with more oxidant than the whole', { zone: { by: 'lambda', lambda: 1.5 } }, { reason: 'zone-leaner' }],
    [
      'a loss of an unknown heating value',
      { heat: { heat: 'adiabatic', lossShare: 0.1 } },
      { reason: 'no-heating-value' },
    ],
    ['an unknown energy', { fuel: { ...methane, enthalpyJPerKg: null } }, { reason: 'no-energy', stream: 'fuel' }],
    [
      'an unknown energy of air',
      { oxidant: { ...plainAir(), enthalpyJPerKg: null } },
      { reason: 'no-energy', stream: 'oxidant' },
    ],
    [
      'a volume of no gas',
      {
        fuel: stream('gas_oil'),
        oxidant: { ...plainAir(), gasMolPerKg: 0 },
        held: { held: 'volume', chargePressurePa: 1e5 },
      },
      { reason: 'no-gas' },
    ],
    ['a zone of nothing', { zone: { by: 'lambda', lambda: -1 } }, { reason: 'not-positive', of: 'zone' }],
  ])('%s', (_, more, fault) => {
    expect(prepareBurn({ ...burn(methane).input, ...more })).toMatchObject({ kind: 'fault', ...fault });
  });
});
