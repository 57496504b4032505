// Rows of messages.test.ts about gas turbines, steam plants and hot metal: a shape of each fact and what a person reads of it,
// and which of them are no errors.
import type { Fact } from '../../../server/scenario/facts.ts';
import { quantity } from '../../support/scenario-builder.ts';

const celsius = (value: number): ReturnType<typeof quantity> => quantity(value, 'degC', 0, 'temperature');
const share = (value: number): ReturnType<typeof quantity> => quantity(value, '1');

export const PLANT_ROWS: readonly (readonly [Fact, string])[] = [
  [
    { code: 'engine/pressure-ratio', ratio: share(0.1) },
    'A pressure ratio of 0.1 compresses nothing. Write the pressure behind over that before the compressor: 10 to 30 for gas turbines without a recuperator, 3 to 8 with one.',
  ],
  [
    {
      code: 'engine/turbine-inlet',
      why: 'not-hot-enough',
      of: 'inlet',
      asked: celsius(2600),
      reaches: celsius(2220),
    },
    'The turbine inlet cannot reach 2600 °C: with all its oxygen burnt the gas has 2220 °C. Ask for less.',
  ],
  [
    {
      code: 'engine/turbine-inlet',
      why: 'not-hot-enough',
      of: 'reheat',
      asked: celsius(2000),
      reaches: celsius(1700),
    },
    'The reheat cannot reach 2000 °C: with all its oxygen burnt the gas has 1700 °C. Ask for less, or for a colder turbine inlet that leaves more oxygen.',
  ],
  [
    { code: 'engine/turbine-inlet', why: 'comes-hotter', of: 'inlet', asked: celsius(300), comes: celsius(410) },
    'The turbine inlet is to have 300 °C, but the air already comes with 410 °C. Ask for more.',
  ],
  [
    { code: 'engine/turbine-inlet', why: 'comes-hotter', of: 'reheat', asked: celsius(600), comes: celsius(750) },
    'The reheat is to have 600 °C, but the gas already comes with 750 °C. Ask for more.',
  ],
  [
    { code: 'engine/turbine-solids', share: share(0.0165), inlet: celsius(1250) },
    '1.65 % of the gas by mass is solid or molten as it enters the turbine at 1250 °C; blades stand some parts per million. Such a fuel is outside gas-turbine practice: take the solids out before the turbine, or fire it externally through an air heater.',
  ],
  [
    { code: 'engine/no-plant', why: 'no-work' },
    'There is no net work: the compressor takes all that the turbine gives. Raise the turbine inlet temperature or the efficiencies, or lower the pressure ratio.',
  ],
  [
    { code: 'engine/no-plant', why: 'no-state', stage: 'turbine', side: 'below', limit: celsius(-73.15) },
    'In the turbine it would be colder than all data (−73.15 °C). Check temperatures, pressures and λ.',
  ],
  [
    { code: 'engine/no-plant', why: 'no-state', stage: 'furnace', side: null, limit: null },
    'There is no state for the furnace with these entries. Check temperatures, pressures and λ.',
  ],
  [
    { code: 'engine/steam-states', why: 'pressures' },
    'The pressures do not fall from the boiler (over the reheater) to the condenser. Are two of them exchanged, or is one gauge instead of absolute?',
  ],
  [
    { code: 'engine/steam-states', why: 'not-steam', asked: celsius(280), boils: celsius(311) },
    'Live steam of 280 °C is below saturation: at that pressure water boils at 311 °C. Raise the temperature or lower the boiler pressure.',
  ],
  [
    { code: 'engine/steam-states', why: 'reheat', asked: celsius(300), from: celsius(350) },
    'Steam comes to the reheater with 350 °C and would leave it with 300 °C. Reheat to more, or at a lower pressure.',
  ],
  [
    { code: 'engine/steam-states', why: 'feedwater', asked: celsius(320), from: celsius(34), to: celsius(311) },
    'Feedwater of 320 °C is impossible here: it leaves the pump with 34 °C and boils in the boiler at 311 °C. Give a temperature between, or leave it out.',
  ],
  [
    { code: 'engine/steam-states', why: 'outside', at: 'boiler', limit: 'near-critical' },
    'The state at the boiler lies near the critical point (above 350 °C and denser than steam), where the formulation of water used here has no equation. Move the pressure or the temperature.',
  ],
  [
    { code: 'engine/boiler-heat', why: 'none-left' },
    'Down to that exhaust temperature the gas gives the steam nothing: it leaves hotter than the flame, or the walls take all. Lower the exhaust temperature or the heat loss.',
  ],
  [
    { code: 'engine/boiler-heat', why: 'cold-stack', stack: celsius(120), feedwater: celsius(160) },
    'The gas cannot leave with 120 °C: the coldest water it meets, the feedwater, has 160 °C. Raise the exhaust temperature or take colder feedwater.',
  ],
  [
    { code: 'engine/boiler-heat', why: 'pinch', boils: celsius(276), share: share(0.82) },
    "The gas above the boiling water's 276 °C gives only 82 % of the heat that evaporating and superheating take. Use less air, a lower boiler pressure, or let the gas leave hotter.",
  ],
  [
    { code: 'engine/wet-steam', wetness: share(0.255), usual: share(0.12) },
    '25.5 % of the steam by mass is water where it leaves the turbine; about 12 % is the usual limit. Superheat further, reheat, lower the boiler pressure or raise that of the condenser.',
  ],
  [
    {
      code: 'engine/deposits',
      from: celsius(680),
      to: celsius(680),
      firstMelting: celsius(581),
      sticky: celsius(655),
      uncertaintyK: 30,
      salts: ['NaCl', 'KCl'],
      validity: [],
    },
    'On metal of 680 °C the deposit (NaCl and KCl) is sticky: it begins to melt at 581 °C (± 30 K) and sticks from 655 °C on. Keep the metal colder than that, take the solids out before it, or use less alkali.',
  ],
  [
    {
      code: 'engine/deposits',
      from: celsius(600),
      to: celsius(700),
      firstMelting: null,
      sticky: null,
      uncertaintyK: null,
      salts: ['Li2CO3', 'Na2S'],
      validity: ['eutectic-of-some', 'traces-left-out'],
    },
    'Whether the deposit (Li2CO3 and Na2S) sticks to metal from 600 °C to 700 °C is not known: how its salts melt together is not published. That is the first melting of some of its salts; together they may melt earlier. It is judged without traces of other salts, which can make it stick some 30 K earlier. Keep the metal colder than that, take the solids out before it, or use less alkali.',
  ],
  [
    {
      code: 'engine/hot-corrosion',
      by: 'sulphate-type-2',
      from: celsius(680),
      to: celsius(680),
      salts: ['Na2SO4'],
    },
    'Na2SO4 lies on metal of 680 °C, in the window of type II sulphate hot corrosion (about 650 to 800 °C). Keep sulphur or alkali out of the fuel, the metal out of the window, or coat it for that attack.',
  ],
  [
    {
      code: 'engine/hot-corrosion',
      by: 'sulphate-type-1',
      from: celsius(820),
      to: celsius(900),
      salts: ['Na2SO4', 'K2SO4'],
    },
    'Na2SO4 and K2SO4 lie on metal from 820 °C to 900 °C, in the window of type I sulphate hot corrosion (about 800 to 950 °C). Keep sulphur or alkali out of the fuel, the metal out of the window, or coat it for that attack.',
  ],
  [
    { code: 'engine/hot-corrosion', by: 'vanadate', from: celsius(650), to: celsius(650), salts: [] },
    'Vanadium in the fuel meets metal of 650 °C: its melts with alkali attack metal from about 590 °C on. Keep the metal colder, or bind the vanadium with magnesium.',
  ],
  [
    {
      code: 'engine/basic-attack',
      from: celsius(660),
      to: celsius(660),
      salts: ['Na2CO3'],
      firstMelting: celsius(632),
    },
    'Na2CO3 lies molten on metal of 660 °C (first melting at 632 °C) and dissolves its oxide (basic fluxing). Keep the metal below first melting, or take the solids out before it.',
  ],
  [
    {
      code: 'engine/basic-attack',
      from: celsius(860),
      to: celsius(900),
      salts: ['Na2CO3', 'NaOH'],
      firstMelting: null,
    },
    'Na2CO3 and NaOH lie molten on metal from 860 °C to 900 °C and dissolve its oxide (basic fluxing). Keep the metal below first melting, or take the solids out before it.',
  ],
];

export const PLANT_MILD: readonly string[] = [
  'warning engine/basic-attack',
  'warning engine/basic-attack',
  'warning engine/deposits',
  'warning engine/deposits',
  'warning engine/hot-corrosion',
  'warning engine/hot-corrosion',
  'warning engine/hot-corrosion',
  'warning engine/turbine-solids',
  'warning engine/wet-steam',
];
