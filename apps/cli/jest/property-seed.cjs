// Property tests draw the same cases on every run, so that a change is judged by what it changed; FC_SEED=random (or a number) looks further.
const fc = require('fast-check');

const chosen = process.env.FC_SEED ?? '20261201';
if (chosen !== 'random') fc.configureGlobal({ ...fc.readConfigureGlobal(), seed: Number(chosen) });
