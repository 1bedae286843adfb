import { CompareDrawing } from '@/components/charts/CompareDrawing';
import { LineProfileDrawing } from '@/components/charts/LineProfileDrawing';
import { ProfileDrawing } from '@/components/charts/ProfileDrawing';
import { ResidualDrawing } from '@/components/charts/ResidualDrawing';
import { SizesDrawing } from '@/components/charts/SizesDrawing';
import { SheetDrawing } from './SheetDrawing';

/**
 * Everything that needs the drawing engine, behind one import: so the engine travels in one piece that only a drawing
 * asks for, and the first pages carry none of it.
 */
export const drawings = {
  compare: CompareDrawing,
  line: LineProfileDrawing,
  profile: ProfileDrawing,
  residual: ResidualDrawing,
  sheet: SheetDrawing,
  sizes: SizesDrawing,
};
