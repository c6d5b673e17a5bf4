import { randomUUID } from "node:crypto";
import { setTimeout as wait } from "node:timers/promises";
import type { Lock, Locker, RequestRelease } from "@tus/server";
import type { DataSource } from "typeorm";
import { HttpProblem } from "../../http/httpProblem";

/** A lock whose holder is gone is free after so long; a living holder renews it in time. */
const leaseS = 15;
const renewMs = 1000;
const askAgainMs = 250;
const patienceMs = 20_000;

/**
 * One upload is written by one request at a time, whichever process serves it. Whoever waits says so, and the holder,
 * whose connection may be cut without its knowing, lets go within about a second.
 */
export class UploadLocks implements Locker {
  constructor(private readonly dataSource: DataSource) {}

  newLock(key: string): Lock {
    return new Lease(this.dataSource, key);
  }

  /** Does something while nobody writes to this upload. */
  async while<Result>(key: string, work: () => Promise<Result>): Promise<Result> {
    const lock = this.newLock(key);
    await lock.lock(new AbortController().signal, () => undefined);
    try {
      return await work();
    } finally {
      await lock.unlock();
    }
  }
}

class Lease implements Lock {
  private readonly holder = randomUUID();
  private renewing: NodeJS.Timeout | undefined;

  constructor(
    private readonly dataSource: DataSource,
    private readonly key: string,
  ) {}

  async lock(signal: AbortSignal, release: RequestRelease): Promise<void> {
    const until = Date.now() + patienceMs;
    while (!(await this.take())) {
      if (signal.aborted || Date.now() > until)
        throw new HttpProblem(423, "upload-busy", "This recording is being sent from another place. Try again.");
      await this.dataSource.query("UPDATE upload_locks SET wanted = true WHERE storage_key = $1", [this.key]);
      await wait(askAgainMs);
    }
    this.renewing = setInterval(() => void this.renew(release), renewMs);
    this.renewing.unref();
  }

  async unlock(): Promise<void> {
    clearInterval(this.renewing);
    await this.dataSource.query("DELETE FROM upload_locks WHERE storage_key = $1 AND holder = $2", [
      this.key,
      this.holder,
    ]);
  }

  private async take(): Promise<boolean> {
    const rows: unknown[] = await this.dataSource.query(
      `INSERT INTO upload_locks (storage_key, holder, held_until) VALUES ($1, $2, now() + make_interval(secs => ${leaseS}))
       ON CONFLICT (storage_key) DO UPDATE SET holder = excluded.holder, held_until = excluded.held_until, wanted = false
         WHERE upload_locks.held_until < now()
       RETURNING storage_key`,
      [this.key, this.holder],
    );
    return rows.length > 0;
  }

  private async renew(release: RequestRelease): Promise<void> {
    try {
      const [rows]: [{ wanted: boolean }[], number] = await this.dataSource.query(
        `UPDATE upload_locks SET held_until = now() + make_interval(secs => ${leaseS})
         WHERE storage_key = $1 AND holder = $2 RETURNING wanted`,
        [this.key, this.holder],
      );
      if (rows[0]?.wanted !== false) await release();
    } catch {
      // A database that does not answer now may do so before the lease ends.
    }
  }
}
