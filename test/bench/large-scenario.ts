// A large scenario for the bench: 300 definitions on 2,000 lines, of the kinds that are evaluated, resting on each other
// as in a real one (fuels, blends of them, blends of blends, claims about those). Invented; the same text every time.
// Invariant: it has no error and its counts are as asked.

const definitionsEach = 10;

/** The text of a scenario with that many definitions (a multiple of ten), about seven lines each. */
export function largeScenario(definitions = 300): string {
  const groups = Array.from({ length: definitions / definitionsEach }, (_, index) => group(index + 1));
  return [`scenario "A large file for the bench"`, '', ...groups.flat()].join('\n');
}

function group(index: number): string[] {
  const percent = (index % 30) + 10;
  return [
    `# Group ${index}: what is bunkered at the ${index}. berth, made up as all of it.`,
    `let margin_${index} = ${percent} %`,
    `let tank_${index} = ${index + 20} m3`,
    '',
    `## Fuel ${index}, by the supplier's certificate.`,
    `substance fuel_${index} {`,
    '  phase: liquid',
    `  composition: ${84 + (index % 10) / 10} % C, ${16 - (index % 10) / 10} % H   # by mass`,
    `  lower heating value: ${42 + (index % 7) / 10} ± 0.2 MJ/kg`,
    `  density: ${780 + index} kg/m3 at 15 degC`,
    '  carbon origin: biogenic 40 %',
    `  source: "certificate ${index}/3"`,
    '}',
    '',
    ...[1, 2, 3, 4].flatMap((number) => [
      `blend mixed_${index}_${number} {`,
      `  ${percent + number} % mass  sodium`,
      `  ${number} % mass   toluene                # keeps it liquid`,
      `  rest       fuel_${index}`,
      '}',
      '',
    ]),
    ...[1, 2].flatMap((number) => [
      `blend trial_${index}_${number} {`,
      `  (margin_${index}) mass  mixed_${index}_${number}`,
      `  20 % mass      xylene`,
      `  rest           mixed_${index}_${number + 2}`,
      '}',
      '',
    ]),
    `oxidant air_${index} {`,
    '  100 % air',
    `  relative humidity: ${40 + index} %`,
    '  state: 18 degC, 1.013 bar',
    '}',
    '',
    `reaction route_${index} {`,
    '  2 Na(cr) + 1/2 O2(g) + CO2(g) -> Na2CO3(cr)',
    `  state: ${25 + index} degC, 1 bar`,
    '}',
    '',
    `reaction burning_${index} {`,
    '  CH4O(l) + 1.5 O2(g) -> CO2(g) + 2 H2O(g)',
    '}',
    '',
    `expect lower heating value of mixed_${index}_1 > 20 MJ/kg`,
    `expect density of trial_${index}_1 within 1 kg/L ± 0.5 kg/L`,
    '',
  ];
}
