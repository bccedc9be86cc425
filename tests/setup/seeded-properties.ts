import fc from 'fast-check';

// The same cases in every run: a property that fails here fails everywhere.
fc.configureGlobal({ seed: 20_260_101 });

export { fc };
