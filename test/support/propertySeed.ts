// Property tests draw the same cases in every run, so that a change is judged by itself; PROPERTY_SEED=random looks further.
import fc from 'fast-check';

const wanted = process.env['PROPERTY_SEED'];

if (wanted !== 'random') fc.configureGlobal({ ...fc.readConfigureGlobal(), seed: Number(wanted ?? 2026) });
