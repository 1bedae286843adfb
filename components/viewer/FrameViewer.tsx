import { useLook } from '@/components/ui/useLook';
import { useViewerState } from './useViewerState';
import { ViewerDesk } from './ViewerDesk';
import { ViewerPhone } from './ViewerPhone';
import type { ViewerProps } from './ViewerProps';

/** The frame viewer: a frame with what was measured on it, to be looked at closely. */
export function FrameViewer(props: ViewerProps) {
  const { desk, theme } = useLook();
  const state = useViewerState(props.frame.id, props.plane, props.measured, theme === 'light');
  return desk ? <ViewerDesk props={props} state={state} /> : <ViewerPhone props={props} state={state} />;
}
