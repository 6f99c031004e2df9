const realNow = Date.now.bind(Date);

/** Sets every clock of the process, the token library's included, ahead of the true time; `jest.restoreAllMocks` sets it back. */
export function travel(aheadMs: number): void {
  jest.spyOn(Date, 'now').mockImplementation(() => realNow() + aheadMs);
}
