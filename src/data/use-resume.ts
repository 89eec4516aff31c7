import { useMemo } from 'react';
import { useMaybeLab } from './client-context';
import type { ResumeRecord } from './store/book-keys';

export interface ResumeHandle {
  /** As it was at the start of this page life. */
  readonly place: ResumeRecord;
  readonly route: (path: string) => void;
  readonly field: (name: string, caret: number | null) => void;
  readonly blur: () => void;
  readonly scroll: (y: number) => void;
}

const NOWHERE: ResumeRecord = { route: null, field: null, caret: null, scroll: 0 };
const NOT_KEPT: ResumeHandle = {
  place: NOWHERE,
  route: () => {},
  field: () => {},
  blur: () => {},
  scroll: () => {},
};

export function useResume(): ResumeHandle {
  const resume = useMaybeLab()?.resume;
  return useMemo(() => {
    if (resume === undefined) return NOT_KEPT;
    const { route, field, blur, scroll } = resume;
    return { place: resume.atStart(), route, field, blur, scroll };
  }, [resume]);
}
