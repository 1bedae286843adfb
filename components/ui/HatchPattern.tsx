import { Pattern, Rect } from 'react-native-svg';

export interface HatchPatternProps {
  /** Unique on the page; used as `url(#id)`. */
  id: string;
  /** px from line to line. */
  step: number;
  /** px, width of a line. */
  line: number;
  angleDeg: 45 | -45;
  colour: string;
}

/** Diagonal lines, for walls, masked areas and clipped pixels. Stands inside Defs. */
export function HatchPattern({ id, step, line, angleDeg, colour }: HatchPatternProps) {
  return (
    <Pattern id={id} width={step} height={step} patternUnits="userSpaceOnUse" patternTransform={`rotate(${angleDeg})`}>
      <Rect width={line} height={step} fill={colour} />
    </Pattern>
  );
}
