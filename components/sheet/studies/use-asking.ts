'use client';

import { useState } from 'react';
import { askStudy } from '@/lib/client/use-study';
import { sayError } from '@/lib/client/fetcher';
import type { StudyQuestion } from '@/lib/contracts/studies';

/** Sends a question to the server; meanwhile the button is busy, and a refusal is said. */
export function useAsking() {
  const [isAsking, setIsAsking] = useState(false);
  const [refusal, setRefusal] = useState<string | null>(null);
  const ask = async (question: StudyQuestion): Promise<string | null> => {
    setIsAsking(true);
    setRefusal(null);
    try {
      return (await askStudy(question)).id;
    } catch (error) {
      setRefusal(sayError(error));
      return null;
    } finally {
      setIsAsking(false);
    }
  };
  return { isAsking, refusal, ask, refuse: setRefusal };
}
