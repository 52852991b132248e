import { useEffect, useState } from 'react';

/** Ages and leases are told in minutes. */
const STEP_MS = 20_000;

/** The time, kept up to date while a page shows how long ago something was. */
export function useNow(): number {
  const [now, setNow] = useState(Date.now);
  useEffect(() => {
    const timer = setInterval(() => setNow(Date.now()), STEP_MS);
    return () => clearInterval(timer);
  }, []);
  return now;
}
