import fc from 'fast-check';

/**
 * Property tests draw the same cases at every run: a red run is then about the change at hand. FAST_CHECK_SEED draws others.
 */
fc.configureGlobal({ seed: Number(process.env['FAST_CHECK_SEED'] ?? 20_261_201) });
