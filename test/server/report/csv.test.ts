import { expect, test } from 'vitest';
import { csvReport } from '../../../server/report/csv.ts';
import { gatherFiles } from '../../../server/report/gather.ts';
import { definition, figure, file, placeIn, quantity, scenario } from '../../support/scenario-builder.ts';

test('one number a row, in contract units, quoted where needed, ended by CR LF', () => {
  const text = 'let rate = 2 kg/s\nblend \'a, "b"\' {}\n';
  const odd = file(text, {
    definitions: [
      definition(text, 'blend', '\'a, "b"\'', [
        figure('density', 850, 'kg/m3', { uncertainty: 5, label: 'Density, at 15 °C' }),
        figure('flash-point', 338.15, 'K'),
      ]),
    ],
    values: [
      {
        name: 'rate',
        place: placeIn('trial.stoke', text, 'let rate = 2 kg/s'),
        namePlace: placeIn('trial.stoke', text, 'rate'),
        quantity: quantity(2, 'kg/s'),
      },
    ],
  });
  expect(csvReport(gatherFiles([{ scenario: scenario(odd), findings: [] }]))).toBe(
    [
      'file,definition,kind,id,label,value,unit,uncertainty',
      'trial.stoke,,let,rate,,2,kg/s,',
      `trial.stoke,"'a, ""b""'",blend,density,"Density, at 15 °C",850,kg/m3,5`,
      `trial.stoke,"'a, ""b""'",blend,flash-point,flash point,338.15,K,`,
      '',
    ].join('\r\n'),
  );
});

test('without a file there is the header', () => {
  expect(csvReport([])).toBe('file,definition,kind,id,label,value,unit,uncertainty\r\n');
});
