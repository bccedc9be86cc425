// The package ships this class without its types; these are the members that `rate-limiter.ts` fills in.
declare module 'rate-limiter-flexible/lib/RateLimiterStoreAbstract.js' {
  import type { RateLimiterRes, RateLimiterStoreAbstract } from 'rate-limiter-flexible';

  /** Points used up under a key, and when they are forgotten (milliseconds). */
  interface StoredPoints {
    points: number;
    expire: number | null;
  }

  export default abstract class extends RateLimiterStoreAbstract {
    protected abstract _upsert(
      key: string,
      points: number,
      milliseconds: number,
      forceExpire?: boolean,
    ): Promise<StoredPoints>;
    protected abstract _get(key: string): Promise<StoredPoints | null>;
    protected abstract _delete(key: string): Promise<boolean>;
    protected abstract _getRateLimiterRes(
      key: string,
      changedPoints: number,
      stored: StoredPoints,
    ): RateLimiterRes;
  }
}
