/** The drawings of assets/icons, one entry a file: paths and rings are stroked, dots and squares filled. Grid of 24. */
export type IconPart =
  | { path: string }
  | { ring: readonly [cx: number, cy: number, r: number] }
  | { dot: readonly [cx: number, cy: number, r: number] }
  | { square: readonly [x: number, y: number, side: number] };

export const iconDrawings = {
  audit: [{ path: 'M5 3.5h14v17H5zM8.5 8h7M8.5 12h7M8.5 16h4' }],
  back: [{ path: 'M14.5 4.5 7 12l7.5 7.5' }],
  bench: [{ path: 'M2.5 19.5h19M3 8h5.5v5H3zM5.8 13v6.5M12.5 5.5v3.6M12.5 11.9v7.6M19.5 5v14.5' }],
  camera: [{ path: 'M4 5h16v14H4zM8 9h8v6H8z' }],
  capture: [{ path: 'M6 3.5v6.3M6 14.2v6.3M19 4v16M6.5 12 19 6.2M6.5 12 19 17.8' }],
  caution: [{ path: 'M12 4 21.2 20H2.8zM12 10v5M12 16.6v1.6' }],
  centre: [{ path: 'M12 3v6.2M12 14.8V21M3 12h6.2M14.8 12H21' }, { dot: [12, 12, 1.2] }],
  cert: [{ path: 'M5 3.5h14v17H5zM8.5 8h7M8.5 11.5h4' }, { ring: [14.6, 15.6, 2.4] }],
  check: [{ ring: [12, 9.5, 5.2] }, { dot: [12, 9.5, 1.6] }, { path: 'M12 14.7v5.3M7 20.3h10' }],
  clock: [{ ring: [12, 12, 8.2] }, { path: 'M12 7v5.2l3.6 2.4' }],
  close: [{ path: 'M5 5l14 14M19 5 5 19' }],
  code: [{ path: 'M4 4h6v6H4zM14 4h6v6h-6zM4 14h6v6H4zM14 14h2.4v2.4H14zM17.8 17.8H20V20h-2.2z' }],
  compare: [{ path: 'M4 4v16h16M4 20 20 6M8.5 13.4v5.2M13.5 9v5.4M18 5v5' }],
  dark: [{ path: 'M4 4h16v16H4zM4 4l16 16' }],
  dist: [{ path: 'M3.5 6v12M20.5 6v12M3.5 12h17M7 9l-3.4 3L7 15M17 9l3.4 3-3.4 3' }],
  down: [{ path: 'M4.5 9.5 12 17l7.5-7.5' }],
  eyewear: [
    {
      path: 'M2.5 9h19M4 9v4.5c0 1.5 1.2 2.7 2.7 2.7h1.6c1.5 0 2.7-1.2 2.7-2.7V9M13 9v4.5c0 1.5 1.2 2.7 2.7 2.7h1.6c1.5 0 2.7-1.2 2.7-2.7V9',
    },
  ],
  filter: [{ path: 'M4 6.5h16M7 12h10M10 17.5h4' }],
  flag: [{ path: 'M6 21V4h12.5l-3.2 4.2 3.2 4.3H6' }],
  frame: [{ path: 'M4 4h16v16H4z' }, { dot: [10, 13.4, 1.9] }, { ring: [10, 13.4, 5.6] }],
  fwd: [{ path: 'M9.5 4.5 17 12l-7.5 7.5' }],
  get: [{ path: 'M12 4v11.5M6.8 10.6 12 15.8l5.2-5.2M4.5 20h15' }],
  giveback: [{ path: 'M9 4.5 4.2 9.3 9 14.1M4.6 9.3h9.2a5.4 5.4 0 0 1 0 10.8H8.5' }],
  hole: [{ path: 'M4 4h16v16H4z' }, { ring: [12, 12, 3.4] }],
  laser: [{ path: 'M3 9h8v6H3zM11 12h9.5M14 8.5l4 7M18 8.5l-4 7' }],
  layers: [{ path: 'M4 8.5 12 4l8 4.5-8 4.5zM4 13l8 4.5 8-4.5' }],
  levels: [{ path: 'M4 20h16M7 20v-5M11 20V7M15 20v-9M19 20v-3' }],
  line: [{ path: 'M5 19 19 5' }, { square: [3.2, 17.2, 3.4] }, { square: [17.2, 3.2, 3.4] }],
  link: [{ path: 'M9.5 14.5l5-5M8 11l-3 3a3.5 3.5 0 0 0 5 5l3-3M16 13l3-3a3.5 3.5 0 0 0-5-5l-3 3' }],
  lock: [{ path: 'M5 11h14v9.5H5zM8 11V7.5a4 4 0 0 1 8 0V11' }],
  lots: [
    { path: 'M3.5 5h17v14h-17z' },
    { dot: [8, 9.4, 1.5] },
    { dot: [12, 9.4, 1.5] },
    { dot: [16, 9.4, 1.5] },
    { dot: [8, 14.6, 1.5] },
    { dot: [12, 14.6, 1.5] },
    { ring: [16, 14.6, 1.3] },
  ],
  mail: [{ path: 'M3.5 5.5h17v13h-17zM3.5 6.5 12 13l8.5-6.5' }],
  mask: [{ path: 'M4 4h16v16H4zM4 12l8-8M4 20 20 4M12 20l8-8' }],
  minus: [{ path: 'M4.5 12h15' }],
  misfit: [{ path: 'M3.5 12h17M6 12V8.5M9.5 12v5M13 12V6M16.5 12v3.4M19.5 12v-2' }],
  more: [{ square: [4, 10.4, 3.4] }, { square: [10.4, 10.4, 3.4] }, { square: [16.8, 10.4, 3.4] }],
  night: [{ path: 'M15.5 4.4A8.2 8.2 0 1 0 19.6 15 7 7 0 0 1 15.5 4.4z' }],
  note: [{ path: 'M4 4h16v12l-4 4H4zM20 16h-4v4' }],
  pair: [{ path: 'M3 4.5h8v15H3zM15.5 9.5H21v10h-5.5' }, { dot: [7, 16.4, 0.9] }, { path: 'M13 7.2h4.5M17.5 4.9v4.6' }],
  people: [
    { ring: [8.5, 8, 3.2] },
    {
      path: 'M3 20v-2.5c0-2 1.6-3.5 3.5-3.5h4c1.9 0 3.5 1.5 3.5 3.5V20M16 5.2a3.2 3.2 0 0 1 0 5.6M17 14.2c2.3.3 4 1.6 4 3.6V20',
    },
  ],
  plan: [{ path: 'M3 6h18v12H3z' }, { dot: [9, 12, 1.7] }, { ring: [9, 12, 4.2] }],
  plus: [{ path: 'M12 4.5v15M4.5 12h15' }],
  print: [{ path: 'M7 9V4h10v5M4 9h16v7.5h-3M7 16.5H4V9M7 13.5h10V20H7z' }],
  put: [{ path: 'M12 16V4.5M6.8 9.6 12 4.4l5.2 5.2M4.5 20h15' }],
  retry: [{ path: 'M18.6 12a6.8 6.8 0 1 1-2.2-5M16.8 2.8V7h-4.2' }],
  rings: [{ ring: [12, 12, 3.4] }, { ring: [12, 12, 8.2] }],
  search: [{ ring: [10.5, 10.5, 6] }, { path: 'M15 15l5.5 5.5' }],
  snap: [{ ring: [12, 12, 8.2] }, { dot: [12, 12, 3.6] }],
  sort: [{ path: 'M8 4.5v15M8 19.5 4.6 16M8 19.5l3.4-3.5M16 19.5v-15M16 4.5 12.6 8M16 4.5 19.4 8' }],
  stills: [{ path: 'M4 8.5h11.5V20H4zM8.5 8.5V4H20v11.5h-4.5M9.75 11.2v6.1M6.7 14.25h6.1' }],
  tick: [{ path: 'M4.5 12.8 9.6 18 20 6.2' }],
  today: [{ path: 'M4 12.5V20h16v-7.5M4 16h4.5l1.2 2h4.6l1.2-2H20' }, { dot: [12, 7, 2.6] }],
  tone: [{ path: 'M4 20h16M4 20C9 20 9.5 6 20 5' }],
  unwrap: [{ path: 'M4 6h16M4 11h16M4 16h16M4 20.5h16' }],
} as const satisfies Record<string, readonly IconPart[]>;

export type IconName = keyof typeof iconDrawings;
