import fc from 'fast-check';

// The same cases every time, so that a red run can be repeated; FEWLIFT_SEED looks at others.
fc.configureGlobal({ seed: Number(process.env.FEWLIFT_SEED ?? 20_260) });
