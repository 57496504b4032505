// The jobs there are, by name: each a function of core that takes longer than a key may wait (over about 5 ms). A row here
// is all that a long computation needs to be done off the server's thread; the worker's bundle holds what is named here.
// Invariant: a name stands for one function, so an answer is known by the name and the key of its input.
import { pathAccountOf } from '../core/burn/path-account.ts';
import { readProfile } from '../core/duty/profile.ts';
import { judgePairs } from '../core/hazard/find-hazards.ts';
import type { JobTable } from './job.ts';

export const jobs = {
  'burn-path': pathAccountOf,
  'duty-profile': readProfile,
  'hazard-pairs': judgePairs,
} as const satisfies JobTable;
