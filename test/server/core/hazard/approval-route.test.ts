// Which rules govern a fuel: by kind first, then by flash point; and every route carries its date.

import { expect, test } from 'vitest';
import { approvalRouteOf, knownAsOf } from '../../../../server/core/hazard/approval-route.ts';
import { storeOf } from './stores.ts';

test.each([
  [{ gas_oil: 100 }, 'oil-fuel'],
  [{ fame: 100 }, 'oil-fuel'],
  [{ kerosene: 100 }, 'low-flash-oil'],
  [{ petrol: 5, gas_oil: 95 }, 'low-flash-oil'],
  [{ methanol: 100 }, 'alcohols'],
  [{ ethanol: 30, water: 70 }, 'alcohols'],
  [{ acetone: 100 }, 'igf-code'],
  [{ lng: 100 }, 'igf-code'],
  [{ dimethyl_ether: 100 }, 'igf-code'],
  [{ lpg: 100 }, 'lpg'],
  [{ propane: 60, butane: 40 }, 'lpg'],
  [{ ammonia: 100 }, 'ammonia'],
  [{ hydrogen: 100 }, 'hydrogen'],
  [{ sodium: 30, gas_oil: 70 }, 'metal-fuel'],
  [{ sodium: 30, toluene: 70 }, 'metal-fuel'],
  [{ iron: 100 }, 'metal-fuel'],
  [{ sodium_borohydride: 30, caustic_lye: 70 }, 'metal-fuel'],
  [{ coal: 50, water: 50 }, 'no-code'],
  [{ nitrogen: 100 }, undefined],
  [{ water: 100 }, undefined],
] as readonly (readonly [Record<string, number>, string | undefined])[])('%o', (percent, id) => {
  const route = approvalRouteOf(storeOf({ percent }));
  expect(route?.id).toBe(id);
  if (route) expect(route.since <= knownAsOf && /^\d{4}-\d{2}/.test(route.since)).toBe(true);
});
