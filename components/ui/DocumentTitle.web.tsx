import { useEffect } from 'react';

/** The name of the screen in the tab and the history of the browser. */
export function DocumentTitle({ title }: { title: string }) {
  useEffect(() => {
    document.title = title === 'Ringwright' ? title : `${title}, Ringwright`;
  }, [title]);
  return null;
}
