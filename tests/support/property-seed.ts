import fc from "fast-check";

/** One seed for all property tests, so that a red run is red again; FAST_CHECK_SEED tries another. */
fc.configureGlobal({ ...fc.readConfigureGlobal(), seed: Number(process.env.FAST_CHECK_SEED ?? 20261201) });
