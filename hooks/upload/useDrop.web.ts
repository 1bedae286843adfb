import { useEffect, useRef, useState } from 'react';
import { droppedFiles } from './droppedFiles.web';
import { fileSource } from './fileSource.web';
import type { FrameSource } from './frameSource';

const carriesFiles = (event: DragEvent) => event.dataTransfer?.types.includes('Files') === true;

/** Takes files dropped anywhere on the page while the screen is shown; `over` while they are held above it. */
export function useDrop(onSources: (sources: FrameSource[]) => void): { canDrop: boolean; over: boolean } {
  const [over, setOver] = useState(false);
  const handler = useRef(onSources);
  useEffect(() => {
    handler.current = onSources;
  }, [onSources]);
  useEffect(() => {
    // Enter and leave come once for every element that is crossed: count them.
    let depth = 0;
    const enter = (event: DragEvent) => {
      if (!carriesFiles(event)) return;
      depth += 1;
      setOver(true);
    };
    const leave = (event: DragEvent) => {
      if (!carriesFiles(event)) return;
      depth = Math.max(0, depth - 1);
      if (depth === 0) setOver(false);
    };
    const hold = (event: DragEvent) => {
      if (carriesFiles(event)) event.preventDefault();
    };
    const drop = (event: DragEvent) => {
      if (!carriesFiles(event) || !event.dataTransfer) return;
      event.preventDefault();
      depth = 0;
      setOver(false);
      void droppedFiles(event.dataTransfer).then((files) => handler.current(files.map((file) => fileSource(file))));
    };
    window.addEventListener('dragenter', enter);
    window.addEventListener('dragleave', leave);
    window.addEventListener('dragover', hold);
    window.addEventListener('drop', drop);
    return () => {
      window.removeEventListener('dragenter', enter);
      window.removeEventListener('dragleave', leave);
      window.removeEventListener('dragover', hold);
      window.removeEventListener('drop', drop);
    };
  }, []);
  return { canDrop: window.matchMedia('(pointer: fine)').matches, over };
}
