import type { Href } from 'expo-router';
import type { ReactNode } from 'react';
import type { CaptureDetail, CaptureFrame } from '@/shared/contracts/captures';
import type { FramePlane, MisfitPlane } from '@/shared/optics/framePlane';
import type { LineSegment } from '@/shared/optics/lineProfile';
import type { MeasuredFrame } from './SheetScene';

/** Why a frame has no rings, in words, with what to do. */
export interface NoRings {
  title: string;
  message: string;
}

/** What the viewer shows and what it can ask for. */
export interface ViewerProps {
  capture: CaptureDetail;
  frame: CaptureFrame;
  /** Place of the frame among those of its kind, from 1, and their number. */
  position: { number: number; count: number };
  back: Href;
  plane: FramePlane | null;
  /** Stands in place of the pixels: waiting, or what went wrong. */
  planeNotice: ReactNode;
  misfit: MisfitPlane | null;
  measured: MeasuredFrame | null;
  /** Null where rings are shown, or are still to come. */
  noRings: NoRings | null;
  pixelPitchUm: number | null;
  film: ReactNode;
  onSaveLine: (segment: LineSegment) => void;
  saving: boolean;
  saveProblem: string | null;
}
