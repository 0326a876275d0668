import fc from 'fast-check';

/** The same draws in every run, so that a red test stays red; `PROPERTY_SEED=7 npm run test:unit` draws others. */
fc.configureGlobal({ ...fc.readConfigureGlobal(), seed: Number(process.env.PROPERTY_SEED ?? 412) });

export default fc;
