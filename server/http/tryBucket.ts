import { RateLimiterPostgres, RateLimiterRes } from "rate-limiter-flexible";
import type { DataSource } from "typeorm";
import { HttpProblem } from "./httpProblem";

const quarterHourS = 900;

/** What a route that counts tries may answer, as the API's description words it. */
export const tooMany = { description: "Tried too often (too-many-tries); Retry-After tells the seconds to wait." };

/** Allows so many tries by one key in so many seconds; the count is shared by all servers on the database. */
export class TryBucket {
  private readonly limiter: RateLimiterPostgres;

  constructor(dataSource: DataSource, keyPrefix: string, points: number, duration = quarterHourS) {
    this.limiter = new RateLimiterPostgres({
      storeClient: dataSource,
      storeType: "typeorm",
      tableName: "tries",
      tableCreated: true,
      clearExpiredByTimeout: true,
      keyPrefix,
      points,
      duration,
    });
  }

  /** Counts a try, or several at once, and refuses one too many. */
  async take(key: string, tries = 1): Promise<void> {
    try {
      await this.limiter.consume(key, tries);
    } catch (error) {
      if (!(error instanceof RateLimiterRes)) throw error;
      const minutes = Math.max(1, Math.ceil(error.msBeforeNext / 60_000));
      throw new HttpProblem(
        429,
        "too-many-tries",
        `That was tried too often. Try again in ${minutes === 1 ? "a minute" : `${minutes} minutes`}.`,
        undefined,
        { "Retry-After": String(Math.max(1, Math.ceil(error.msBeforeNext / 1000))) },
      );
    }
  }

  async forgive(key: string): Promise<void> {
    await this.limiter.delete(key);
  }

  async giveBack(key: string): Promise<void> {
    await this.limiter.reward(key, 1);
  }
}
