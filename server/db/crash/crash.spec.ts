import { removeTemporaryFolders, temporaryFolder } from '../../testing/temporary-folder.js';
import { crashDriver, crashQueue } from './harness.js';

describe('a process killed while it writes', () => {
  afterEach(removeTemporaryFolders);

  it('loses nothing that was acknowledged, in 30 kills', async () => {
    const report = await crashQueue({ kills: 30, folder: await temporaryFolder(), seed: 20_260 });

    expect(report.kills).toBe(30);
    expect(report.lost).toBe(0);
    expect(report.unusable).toBe(0);
    // Otherwise nothing was put to the test.
    expect(report.acknowledged).toBeGreaterThan(1000);
  }, 600_000);

  it("loses writes with the driver's own saving, so that the test above is not blind", async () => {
    const report = await crashDriver({ kills: 10, folder: await temporaryFolder() });

    expect(report.lost + report.unusable).toBeGreaterThan(0);
  }, 600_000);
});
