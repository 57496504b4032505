// The air an engine draws in where no oxidant is named: dry, at 25 °C and 1 bar, as the catalogue has it.

import { findSubstance } from '../core/substance/catalogue.ts';
import { materialOfSubstance } from './materials.ts';
import { streamOfMaterial, type OxidantStream } from './oxidant-stream.ts';

export function dryAir(): OxidantStream {
  const air = findSubstance('air');
  const stream = air && streamOfMaterial(materialOfSubstance(air));
  if (!stream) throw new Error('the catalogue has no air');
  return stream;
}
