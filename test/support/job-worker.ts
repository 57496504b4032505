// The worker of the tests and benches: the product's own, with the jobs of job-table.ts.
import { parentPort } from 'node:worker_threads';
import { nodePort } from '../../server/jobs/node-port.ts';
import { serveJobs } from '../../server/jobs/serve-jobs.ts';
import { jobTable } from './job-table.ts';

serveJobs(jobTable, nodePort(parentPort));
