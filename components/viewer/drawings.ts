/**
 * Everything that needs the drawing engine, behind one import: so the engine travels in one piece that only a drawing
 * asks for, and the first pages carry none of it.
 */
export { CompareDrawing } from '@/components/charts/CompareDrawing';
export { LineProfileDrawing } from '@/components/charts/LineProfileDrawing';
export { ProfileDrawing } from '@/components/charts/ProfileDrawing';
export { ResidualDrawing } from '@/components/charts/ResidualDrawing';
export { SizesDrawing } from '@/components/charts/SizesDrawing';
export { SheetDrawing } from './SheetDrawing';
