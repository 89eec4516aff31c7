import { useCallback } from 'react';
import { useNavigate } from 'react-router-dom';

/** Navigation without its promise: nothing in the frame waits for it. */
export function useGo(): (path: string) => void {
  const navigate = useNavigate();
  return useCallback((path: string) => void navigate(path), [navigate]);
}
