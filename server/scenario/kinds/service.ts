// `service`: a duty done over and over, with its tanks, reserve, residue and a baseline. Reads the entries, has core add it
// up, and says where its tanks are too small. Knows no engine from inside.
// Invariant: figures are the same whether a baseline is given or not; the baseline is the same work on one other fuel.

import type { Definition, Span } from '../../../grammar/tree.ts';
import { knownUnit } from '../../core/quantity/convert.ts';
import { quantityOf } from '../../core/quantity/quantity.ts';
import type { ServiceSums } from '../../core/service/service.ts';
import type { Context } from '../context.ts';
import { readEntries, refuseLines, type EntriesRead } from '../entries.ts';
import type { FigureRow } from '../material-figures.ts';
import { propagatedFigures } from '../propagated-figures.ts';
import { QuantityList } from '../quantity-list.ts';
import type { Absent } from '../scenario.ts';
import { fuelTable, onBoardTable, serviceFigures, serviceValues } from '../service-figures.ts';
import {
  fuelledService,
  hasOwnTanks,
  mainFuelOf,
  serviceMachineOf,
  type FuelledService,
  type WrittenService,
} from '../service-machine.ts';
import { unmeasuredLoads } from '../unmeasured-loads.ts';
import type { AssumptionId, Working, WorkingInput } from '../working.ts';
import { lazyAnswer, unknownAnswer, type EvaluatedKind, type Kind, type KindAnswer } from './kind.ts';
import { defaultFilling, serviceEntries } from './service-entries.ts';

const evaluated: EvaluatedKind = { entries: serviceEntries, lines: [], figures: serviceFigures, evaluate };

export const service: Kind = {
  kind: 'service',
  help: 'A duty repeated over a year, with its tanks, reserve, residue and a baseline to hold it against.',
  evaluated,
};

type Read = EntriesRead<typeof serviceEntries>;

function evaluate(definition: Definition, context: Context): KindAnswer {
  const { entries: read, broken } = readEntries(definition, serviceEntries, context);
  refuseLines(definition, [], context);
  const duty = read.duty?.value;
  const isBroken = broken.size > 0 || definition.lines.some(({ kind }) => kind === 'broken-line');
  if (isBroken || !duty) return unknownAnswer(evaluated);
  const written: WrittenService = {
    name: context.owner,
    duty,
    repeated: read.repeated?.value.quantity ?? null,
    reserve: read.reserve?.value ?? null,
    dutiesBetween: read.dutiesBetween?.value.quantity ?? null,
    tanks: read.tanks?.value ?? null,
    defaultFilling,
    boilOff: read.boilOff?.value.quantity ?? null,
    keepsResidue: read.residue?.value.to !== 'discharged',
    carriesWater: read.water?.value === 'carried',
    against: read.against?.value ?? null,
  };
  const list = new QuantityList();
  const own = fuelledService(written, (fuel) => fuel, list, false);
  const { against } = written;
  const baseline = against && fuelledService(written, () => against, list, true);
  const repeated = list.add(written.repeated);
  const between = list.add(written.dutiesBetween, 1);
  const sums = own.sumsAt(list.values, 'value');
  reportTanks(own, sums, written, read.tanks?.entry.span ?? definition.header, context);
  const working = workingOf(written, read, context);
  return lazyAnswer(
    {
      machinery: serviceMachineOf(
        written,
        mainFuelOf(own, list.values),
        () => baseline && baseline.sumsAt(list.values, 'value'),
      ),
    },
    {
      figures: () =>
        propagatedFigures(
          serviceFigures,
          list.quantities,
          (values) =>
            serviceValues(
              (corner) => own.sumsAt(values, corner),
              baseline && ((corner) => baseline.sumsAt(values, corner)),
              written.repeated && repeated(values),
              between(values),
            ),
          working,
        ),
      tables: () => [fuelTable(own, sums, written.repeated?.value ?? null), onBoardTable(duty.legNames, sums)],
      absent: () => absentOf(own, baseline, unmeasuredLoads(duty).idling),
    },
  );
}

/** Says where the fuel to be carried does not fit, and which leg would be the first without. */
function reportTanks(
  own: FuelledService,
  sums: ServiceSums,
  written: WrittenService,
  span: Span,
  context: Context,
): void {
  const capacity = written.tanks?.capacity;
  const filling = written.tanks?.maximumFilling?.value ?? written.defaultFilling;
  if (!capacity || !(sums.carriedM3 > capacity.value * filling * (1 + 1e-9))) return;
  const usableKg = (capacity.value * filling * sums.carriedKg) / sums.carriedM3;
  const shortKg = sums.carriedKg - usableKg;
  const leg = sums.afterLegs.findIndex(({ fuelKg }) => fuelKg < shortKg);
  context.report(span, {
    code: 'service/tank',
    fuel: own.fuels.map(({ name }) => name).join(', '),
    needed: quantityOf(sums.carriedM3 / filling, knownUnit('m3').dimension),
    capacity,
    leg: leg < 0 ? null : (written.duty.legNames[leg] ?? null),
  });
}

/** A figure that is not there because an engine does not run on a fuel, or a fuel's datum is not known. */
function absentOf(own: FuelledService, baseline: FuelledService | null, idling: readonly string[]): Absent {
  const idle = idling.map((engine) => `the idle consumption of ${engine}`);
  const missing = [...own.missing, ...(baseline?.missing ?? []), ...idle];
  const densities = own.fuels.filter(({ density }) => !density).map(({ name }) => `the density of ${name}`);
  const absent = new Map<string, readonly string[] | null>();
  for (const { id, method } of serviceFigures) {
    if (method === 'against-baseline' && !baseline) continue;
    if (missing.length > 0) absent.set(id, missing);
    else if (densities.length > 0 && ['fuel-volume', 'tank-volume'].includes(id)) absent.set(id, densities);
  }
  return absent;
}

function workingOf(written: WrittenService, read: Read, context: Context): (row: FigureRow) => Working {
  const place = (key: keyof Read): { readonly place?: ReturnType<Context['place']> } => {
    const found = read[key];
    return found ? { place: context.place(found.entry.span) } : {};
  };
  const inputs: WorkingInput[] = [
    { label: 'how often the duty is done', quantity: written.repeated, unit: '1/year', ...place('repeated') },
    {
      label: 'reserve, of the fuel of the duties',
      quantity: written.reserve ?? quantityOf(0),
      unit: '%',
      ...place('reserve'),
    },
    {
      label: 'duties between bunkerings',
      quantity: written.dutiesBetween ?? quantityOf(1),
      unit: '1',
      ...place('dutiesBetween'),
    },
    {
      label: 'maximum filling of the tanks',
      quantity: written.tanks?.maximumFilling ?? quantityOf(written.defaultFilling),
      unit: '%',
      ...place('tanks'),
    },
  ];
  const permit =
    read.residue?.value.to === 'discharged' ? [`residue discharged under: ${read.residue.value.permit}`] : [];
  const isBoiling = written.boilOff !== null;
  const assumptions = (method: Working['method']): readonly AssumptionId[] => [
    ...(assumptionsOf[method] ?? []),
    ...(method === 'against-baseline' && hasOwnTanks(written) ? (['bare-tanks'] as const) : []),
    ...(method === 'service-tank' && isBoiling && !written.repeated ? (['boil-off-on-duty'] as const) : []),
    ...(restsOnFuel.has(method) && unmeasuredLoads(written.duty).isBeyond ? (['beyond-measured'] as const) : []),
  ];
  return ({ method }) => ({ method, inputs, sources: permit, assumptions: assumptions(method) });
}

const restsOnFuel: ReadonlySet<Working['method']> = new Set([
  'service-fuel',
  'service-emission',
  'service-residue',
  'service-tank',
  'service-endurance',
  'against-baseline',
]);

const assumptionsOf: Readonly<Partial<Record<Working['method'], readonly AssumptionId[]>>> = {
  'service-fuel': ['lower-heating-value-basis'],
  'service-emission': ['all-carbon-to-dioxide'],
  'service-residue': ['slate-as-residue'],
  'against-baseline': ['baseline-all-engines'],
};
