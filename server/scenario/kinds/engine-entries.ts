// The entries of an engine, by cycle or by measurement: one table for both ways, one row an entry. Which of them a cycle
// needs and uses is said by the file of that cycle; nothing is worked out here. Defaults are named where they are used.

import { heatLossReader, oxidantReader } from '../burn-readers.ts';
import type { Definition } from '../../../grammar/tree.ts';
import type { Context } from '../context.ts';
import { atLoadsReader, measuredOnReader, pilotReader, slipReader } from '../engine-readers.ts';
import type { DefinitionRead, EntriesRead } from '../entries.ts';
import { materialReader, quantityReader, wordReader } from '../readers.ts';
import type { KindAnswer } from './kind.ts';

const convention = 'convention of this program';

export const cycleWords = ['otto', 'diesel', 'dual', 'brayton', 'rankine'] as const;
export type CycleWord = (typeof cycleWords)[number];

const temperature = (example: string): ReturnType<typeof quantityReader> =>
  quantityReader('degC', `a temperature, such as \`${example}\``, { temperature: true, range: 'positive' });
const pressure = (example: string): ReturnType<typeof quantityReader> =>
  quantityReader('bar', `a pressure, such as \`${example}\``, { range: 'positive' });
const share = (example: string): ReturnType<typeof quantityReader> =>
  quantityReader('%', `a share, such as \`${example}\``, { range: 'share' });
/** A share above nothing. */
const part = (example: string): ReturnType<typeof quantityReader> =>
  quantityReader('%', `a share, such as \`${example}\``, { range: 'part' });
const ratio = (example: string): ReturnType<typeof quantityReader> =>
  quantityReader('1', `a number, such as \`${example}\``, { range: 'positive' });

export const engineEntries = {
  cycle: {
    name: 'cycle',
    reader: wordReader(cycleWords),
    help: 'The cycle it works: Otto (heat at constant volume), Diesel (constant pressure), limited-pressure dual, Joule–Brayton (gas turbine), or Rankine (steam). Give this, or what was measured.',
  },
  specificFuelConsumption: {
    name: 'specific fuel consumption',
    reader: atLoadsReader('g/kWh', 'masses of fuel for the work at the shaft, such as `209 g/kWh at 50 %`', 'positive'),
    help: 'Measured consumption against load. Between the points it is interpolated by a monotone cubic; outside them it is not known.',
  },
  efficiency: {
    name: 'efficiency',
    reader: atLoadsReader('%', 'brake efficiencies, such as `41.5 % at 50 %`', 'share'),
    help: 'Measured brake efficiency against load, on the lower heating value unless `measured on` says otherwise.',
  },
  measuredOn: {
    name: 'measured on',
    reader: measuredOnReader,
    help: 'The heating value of the fuel it was measured with, the tolerance of the consumption, and the ambient state.',
    default: {
      text: "the fuel's own lower heating value, no tolerance, 25 °C and 100 kPa",
      source: 'reference conditions of ISO 3046-1 and ISO 15550',
    },
  },
  idleConsumption: {
    name: 'idle consumption',
    reader: quantityReader('kg/h', 'a mass flow of fuel, such as `14 kg/h`', { range: 'positive' }),
    help: 'Fuel consumption at idle.',
  },
  maximumContinuousRating: {
    name: 'maximum continuous rating',
    reader: quantityReader('kW', 'a power, such as `6.4 MW`', { range: 'positive' }),
    help: 'The brake power that a load of 100 % means.',
  },
  speed: {
    name: 'speed',
    reader: quantityReader('rpm', 'a speed of rotation, such as `514 rpm`', { range: 'positive' }),
    help: 'The rated speed of the crankshaft. The limits of nitrogen oxides go by it.',
  },
  fuel: {
    name: 'fuel',
    reader: materialReader,
    help: 'The blend or substance it burns.',
    needed: true,
  },
  oxidant: {
    name: 'oxidant',
    reader: oxidantReader,
    help: 'What it draws in, at the state given there.',
    default: { text: 'dry air at 25 °C and 1 bar', source: convention },
  },
  lambda: {
    name: 'lambda',
    reader: quantityReader('1', 'a number, such as `2.1`', { range: 'positive' }),
    help: 'The excess-air ratio λ of what is trapped in the cylinder, or of the combustor.',
    default: {
      text: '2.2 where consumption was measured',
      source: 'common practice of turbocharged compression-ignition engines',
    },
  },
  octaneNumber: {
    name: 'octane number',
    reader: ratio('120'),
    help: 'Motor octane number of a premixed fuel. With the speed it gives an indicator of knock.',
  },
  pilot: {
    name: 'pilot',
    reader: pilotReader,
    help: 'A second fuel that lights the first.',
    default: { text: 'none', source: convention },
  },
  compressionRatio: {
    name: 'compression ratio',
    reader: ratio('16.5'),
    help: 'Cylinder volume at bottom dead centre over that at top dead centre (clearance volume).',
  },
  cutOffRatio: {
    name: 'cut-off ratio',
    reader: ratio('2'),
    help: 'Volume at the end over volume at the start of the heat added at constant pressure. Otherwise it follows from the fuel.',
  },
  maximumFiringPressure: {
    name: 'maximum firing pressure',
    reader: pressure('180 bar'),
    help: 'The pressure at which the heat is added in a limited-pressure cycle, or that must not be passed in another.',
  },
  boostPressure: {
    name: 'boost pressure',
    reader: pressure('3.4 bar'),
    help: 'Absolute pressure of the charge or scavenging air at the start of compression.',
    default: { text: "the oxidant's pressure", source: convention },
  },
  boostTemperature: {
    name: 'boost temperature',
    reader: temperature('45 degC'),
    help: 'Temperature of the charge or scavenging air as it enters the cylinder.',
    default: { text: "the oxidant's temperature", source: convention },
  },
  residualGasShare: {
    name: 'residual gas share',
    reader: quantityReader('%', 'a share, such as `4 %`', { range: { upTo: 0.5 } }),
    help: 'Share by mass of the charge that is burnt gas of the cycle before.',
    default: {
      text: 'what fills the smallest volume at the pressure of the exhaust; 5 % with two strokes',
      source: 'convention of this program; common practice of uniflow scavenging',
    },
  },
  strokes: {
    name: 'strokes',
    reader: wordReader(['four', 'two']),
    help: 'Strokes of the piston for one cycle. With four it draws in and pushes out its gas; with two it is scavenged.',
    default: { text: 'four', source: convention },
  },
  exhaustPressure: {
    name: 'exhaust pressure',
    reader: pressure('2.8 bar'),
    help: 'Absolute pressure behind the cylinder, before any turbine.',
    default: { text: "the oxidant's pressure", source: convention },
  },
  fuelTemperature: {
    name: 'fuel temperature',
    reader: temperature('120 degC'),
    help: 'The temperature the fuel comes in with; melting on the way from 25 °C is counted.',
    default: { text: '25 °C', source: convention },
  },
  heatLossInCombustion: {
    name: 'heat loss while burning',
    reader: share('60 %'),
    help: 'What part of the heat loss leaves while it burns, where it costs most work; the rest leaves at the end of expansion.',
    default: { text: '100 %, the cautious end', source: convention },
  },
  mixture: {
    name: 'mixture',
    reader: wordReader(['premixed', 'injected']),
    help: 'Whether the fuel is compressed with the air or is injected at the end of compression.',
    default: { text: 'premixed in an Otto cycle, injected in the others', source: convention },
  },
  heatLoss: {
    name: 'heat loss',
    reader: heatLossReader,
    help: "Heat lost to the walls, as a share of the fuel's lower heating value.",
    default: { text: 'none', source: convention },
  },
  combustionCompleteness: {
    name: 'combustion completeness',
    reader: part('98.5 %'),
    help: 'Share of the fuel that burns.',
    default: { text: '100 %', source: convention },
  },
  frozenBelow: {
    name: 'frozen below',
    reader: temperature('1400 degC'),
    help: 'The composition of the expanding gas stays as it is there from this temperature down.',
    default: {
      text: 'never; 1000 °C where a measured consumption is carried over to another fuel',
      source: 'convention of this program: solids that form in colder gas come too late for work',
    },
  },
  mechanicalEfficiency: {
    name: 'mechanical efficiency',
    reader: part('92 %'),
    help: 'Brake over indicated power, at the rating.',
    default: { text: '100 %', source: convention },
  },
  exhaustTemperature: {
    name: 'exhaust temperature',
    reader: temperature('350 degC'),
    help: 'Where the exhaust leaves. A measured consumption is carried over to another fuel by the heat released above it.',
    default: {
      text: '350 °C where consumption was measured',
      source: 'common practice behind the turbine of a compression-ignition engine',
    },
  },
  metalTemperature: {
    name: 'metal temperature',
    reader: temperature('550 degC'),
    help: 'Temperature of the hottest metal that the exhaust meets: valves, nozzle rings, blades or superheater.',
  },
  pressureRatio: {
    name: 'pressure ratio',
    reader: ratio('10'),
    help: 'Pressure behind over pressure before the compressor of a gas turbine.',
  },
  turbineInletTemperature: {
    name: 'turbine inlet temperature',
    reader: temperature('1150 degC'),
    help: 'Temperature of the gas as it enters the turbine; λ follows from it, where λ is not given.',
  },
  compressorEfficiency: {
    name: 'compressor efficiency',
    reader: part('86 %'),
    help: 'Isentropic efficiency of the compressor.',
    default: { text: '100 %', source: convention },
  },
  turbineEfficiency: {
    name: 'turbine efficiency',
    reader: part('89 %'),
    help: 'Isentropic efficiency of the turbine, gas or steam.',
    default: { text: '100 %', source: convention },
  },
  recuperatorEffectiveness: {
    name: 'recuperator effectiveness',
    reader: share('80 %'),
    help: 'Heat that the compressed air takes up from the exhaust, over what it could take up.',
    default: { text: 'no recuperator', source: convention },
  },
  intercooledTo: {
    name: 'intercooled to',
    reader: temperature('35 degC'),
    help: 'Temperature to which the air is cooled between two equal stages of compression.',
    default: { text: 'not intercooled', source: convention },
  },
  reheatedTo: {
    name: 'reheated to',
    reader: temperature('1100 degC'),
    help: 'Temperature to which gas or steam is heated again between two stages of expansion.',
    default: { text: 'not reheated', source: convention },
  },
  reheatPressure: {
    name: 'reheat pressure',
    reader: pressure('35 bar'),
    help: 'Pressure at which steam is heated again.',
  },
  combustorPressureLoss: {
    name: 'combustor pressure loss',
    reader: share('4 %'),
    help: 'Pressure lost in the combustor, over the pressure before it.',
    default: { text: 'none', source: convention },
  },
  boilerPressure: {
    name: 'boiler pressure',
    reader: pressure('60 bar'),
    help: 'Absolute pressure of the live steam.',
  },
  steamTemperature: {
    name: 'steam temperature',
    reader: temperature('500 degC'),
    help: 'Temperature of the live steam.',
    default: { text: 'saturated steam', source: convention },
  },
  condenserPressure: {
    name: 'condenser pressure',
    reader: pressure('50 mbar'),
    help: 'Absolute pressure in the condenser.',
  },
  feedwaterTemperature: {
    name: 'feedwater temperature',
    reader: temperature('120 degC'),
    help: 'Temperature of the water as it enters the boiler.',
    default: { text: 'that behind the feed pump', source: convention },
  },
  pumpEfficiency: {
    name: 'pump efficiency',
    reader: part('75 %'),
    help: 'Isentropic efficiency of the feed pump.',
    default: { text: '100 %', source: convention },
  },
  methaneSlip: {
    name: 'methane slip',
    reader: slipReader,
    help: 'Methane that leaves unburnt.',
    default: { text: 'none', source: convention },
  },
  nitrousOxide: {
    name: 'nitrous oxide',
    reader: slipReader,
    help: 'N2O in the exhaust.',
    default: { text: 'none', source: convention },
  },
  ammoniaSlip: {
    name: 'ammonia slip',
    reader: slipReader,
    help: 'Ammonia that leaves, unburnt or from the treatment of the exhaust.',
    default: { text: 'none', source: convention },
  },
  urea: {
    name: 'urea',
    reader: slipReader,
    help: 'Urea (as pure urea) consumed by the exhaust treatment. Its carbon leaves as carbon dioxide.',
    default: { text: 'none', source: convention },
  },
};

export type EngineRead = EntriesRead<typeof engineEntries>;
export type EngineKey = keyof typeof engineEntries;

/** What one way of working an engine out is given. */
export interface EngineAsked {
  readonly read: EngineRead;
  /** Written but not readable: silent. */
  readonly broken: DefinitionRead<typeof engineEntries>['broken'];
  readonly definition: Definition;
  readonly context: Context;
}

/** Works an engine out by its cycle or by what was measured; what is missing or amiss it reports itself. */
export type EngineWay = (asked: EngineAsked) => KindAnswer;
