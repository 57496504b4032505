// The worker as a program of its own under Node: the server starts it as a thread from its bundle (dist/worker.cjs). Holds
// no behaviour, only Node's line to the thread that started it, so that a browser's entry can share the rest.
import { parentPort } from 'node:worker_threads';
import { jobs } from './jobs.ts';
import { nodePort } from './node-port.ts';
import { serveJobs } from './serve-jobs.ts';

serveJobs(jobs, nodePort(parentPort));
