'use client';

import { useEffect, useState } from 'react';

/** The value once it has stood still for `ms`, so that a search is asked when somebody pauses, not at every key. */
export function useSettled<Value>(value: Value, ms = 250): Value {
  const [settled, setSettled] = useState(value);
  useEffect(() => {
    const timer = setTimeout(() => setSettled(value), ms);
    return () => clearTimeout(timer);
  }, [value, ms]);
  return settled;
}
