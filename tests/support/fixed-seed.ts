import fc from 'fast-check'

/** The same draws in every run, so that a red build can be repeated; FC_SEED looks elsewhere. */
fc.configureGlobal({ seed: Number(process.env.FC_SEED ?? 20_261_201) })
