import type { FrameSource } from './frameSource';

type UseDrop = (onSources: (sources: FrameSource[]) => void) => { canDrop: boolean; over: boolean };

const nowhere = { canDrop: false, over: false };

/** Files cannot be dropped on a native device. */
export const useDrop: UseDrop = () => nowhere;
