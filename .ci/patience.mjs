/** A busy machine is no fault of the code: a spec without a limit of its own may take this long, ms. */
jasmine.DEFAULT_TIMEOUT_INTERVAL = 60_000;
