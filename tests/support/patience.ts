// Room for a loaded machine; no test waits for it to pass.
jest.setTimeout(60_000)
