/**
 * Token buckets in the memory of one process. With several web processes each counts for itself, so a caller
 * gets at most the limit times their number: enough to keep one caller from crowding out the others, and it
 * costs no round trip. What must hold exactly (sign-in, mails) is counted in the database instead.
 */
export interface RateLimit {
  name: string;
  limit: number;
  windowSeconds: number;
}

export interface RateLimitAnswer {
  isAllowed: boolean;
  headers: Record<string, string>;
}

interface Bucket {
  tokens: number;
  at: number;
}

const mostBuckets = 10_000;

export function createRateLimiter(rule: RateLimit, now: () => number = Date.now) {
  const buckets = new Map<string, Bucket>();
  const perMs = rule.limit / (rule.windowSeconds * 1000);

  return function take(key: string): RateLimitAnswer {
    const at = now();
    const known = buckets.get(key);
    const tokens = known ? Math.min(rule.limit, known.tokens + (at - known.at) * perMs) : rule.limit;
    const isAllowed = tokens >= 1;
    const left = isAllowed ? tokens - 1 : tokens;
    // Re-inserted at the end, so that the map's first entry is the one unused for longest.
    buckets.delete(key);
    buckets.set(key, { tokens: left, at });
    if (buckets.size > mostBuckets) dropOldest(buckets);

    const secondsToFull = Math.ceil((rule.limit - left) / perMs / 1000);
    const headers: Record<string, string> = {
      "RateLimit-Policy": `"${rule.name}";q=${rule.limit};w=${rule.windowSeconds}`,
      RateLimit: `"${rule.name}";r=${Math.floor(left)};t=${secondsToFull}`,
    };
    if (!isAllowed) headers["Retry-After"] = String(Math.max(1, Math.ceil((1 - left) / perMs / 1000)));
    return { isAllowed, headers };
  };
}

function dropOldest(buckets: Map<string, Bucket>): void {
  const oldest = buckets.keys().next();
  if (!oldest.done) buckets.delete(oldest.value);
}
