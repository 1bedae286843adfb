import type { Href } from 'expo-router';
import { useMemo, useState, type ReactNode } from 'react';
import { View } from 'react-native';
import { Icon } from './Icon';
import { sortedBy, type SortKey } from './sortedBy';
import { Text } from './Text';
import { fontFamily, radius, shell, space, stroke } from './tokens';
import { Touch } from './Touch';
import { useLook } from './useLook';

export interface Column<R> {
  key: string;
  title: string;
  /** The title is only for those who hear it: the column is too narrow. */
  hideTitle?: boolean;
  /** px; without it the column shares what is left. */
  width?: number;
  /** Numbers stand right. */
  align?: 'left' | 'right';
  cell: (row: R) => ReactNode;
  /** What it is sorted by; without it the head cannot be tapped. */
  sortBy?: (row: R) => SortKey;
}

export interface TableProps<R> {
  /** What the table holds, for screen readers. */
  label: string;
  columns: readonly Column<R>[];
  rows: readonly R[];
  rowKey: (row: R) => string;
  /** What a screen reader says for a row that can be pressed. */
  rowLabel?: (row: R) => string;
  rowHref?: (row: R) => Href;
  onRowPress?: (row: R) => void;
  selectedKey?: string | null;
  /** Rows that need a person are lifted, and stand first until the table is sorted. */
  isFirst?: (row: R) => boolean;
  sort?: { key: string; descending: boolean };
}

/** Text that takes no room but is read out. */
const onlyHeard = { position: 'absolute', width: 1, height: 1, overflow: 'hidden', opacity: 0.01 } as const;

/** Rows without lines, 2 px apart; a tap on a head sorts, a second one turns the order. */
export function Table<R>({
  label,
  columns,
  rows,
  rowKey,
  rowLabel,
  rowHref,
  onRowPress,
  selectedKey,
  isFirst,
  sort: first,
}: TableProps<R>) {
  const { colours, desk } = useLook();
  const [sort, setSort] = useState(first ?? null);
  const ordered = useMemo(() => {
    const by = sort ? columns.find((column) => column.key === sort.key)?.sortBy : undefined;
    if (by && sort) return sortedBy(rows, by, sort.descending);
    return isFirst ? [...rows.filter(isFirst), ...rows.filter((row) => !isFirst(row))] : rows;
  }, [rows, columns, sort, isFirst]);
  const cellStyle = (column: Column<R>) => [
    column.width ? { width: column.width } : { flex: 1, minWidth: 0 },
    {
      justifyContent: 'center' as const,
      alignItems: column.align === 'right' ? ('flex-end' as const) : ('flex-start' as const),
    },
  ];
  const line = {
    flexDirection: 'row' as const,
    gap: space.m,
    paddingHorizontal: desk ? 20 : space.l,
    alignItems: 'center' as const,
  };

  return (
    <View role="table" aria-label={label} style={{ gap: space.hair }}>
      <View role="rowgroup">
        <View role="row" style={[line, { minHeight: 34 }]}>
          {columns.map((column) => {
            const sorted = sort?.key === column.key;
            const title = (
              <Text
                variant="label"
                lines={1}
                align={column.align}
                tone={sorted ? 'ink0' : 'ink2'}
                style={sorted ? { fontFamily: fontFamily.textBold } : null}
              >
                {column.title}
              </Text>
            );
            return (
              <View key={column.key} role="columnheader" style={cellStyle(column)}>
                {column.hideTitle ? (
                  <Text variant="label" style={onlyHeard}>
                    {column.title}
                  </Text>
                ) : column.sortBy ? (
                  <Touch
                    label={`Sort by ${column.title}${sorted ? (sort.descending ? ', now descending' : ', now ascending') : ''}`}
                    onPress={() => setSort({ key: column.key, descending: sorted ? !sort.descending : false })}
                    style={{ minHeight: 34, flexDirection: 'row', alignItems: 'center', gap: 4 }}
                  >
                    {sorted && column.align === 'right' ? <SortArrow descending={sort.descending} /> : null}
                    {title}
                    {sorted && column.align !== 'right' ? <SortArrow descending={sort.descending} /> : null}
                  </Touch>
                ) : (
                  title
                )}
              </View>
            );
          })}
        </View>
      </View>
      <View role="rowgroup" style={{ gap: space.hair }}>
        {ordered.map((row) => {
          const key = rowKey(row);
          const chosen = selectedKey === key;
          const lifted = chosen || isFirst?.(row) === true;
          const href = rowHref?.(row);
          const goes = href !== undefined || onRowPress !== undefined;
          const cells = columns.map((column, i) => {
            const content = column.cell(row);
            const carriesTouch = goes && i === 0;
            return (
              <View
                key={column.key}
                role="cell"
                style={[cellStyle(column), carriesTouch ? { position: 'static' } : null]}
              >
                {typeof content === 'string' || typeof content === 'number' ? (
                  <Text align={column.align} lines={1}>
                    {content}
                  </Text>
                ) : (
                  content
                )}
                {carriesTouch ? (
                  <Touch
                    href={href}
                    onPress={onRowPress ? () => onRowPress(row) : undefined}
                    label={rowLabel?.(row) ?? key}
                    current={chosen}
                    style={({ pressed }) => ({
                      position: 'absolute',
                      inset: 0,
                      zIndex: 1,
                      borderRadius: radius.plate,
                      backgroundColor: pressed ? `${colours.ink0}14` : 'transparent',
                    })}
                  >
                    {null}
                  </Touch>
                ) : null}
              </View>
            );
          });
          const bar = chosen ? (
            <View
              style={{
                position: 'absolute',
                left: 0,
                top: 0,
                bottom: 0,
                width: stroke.bar,
                backgroundColor: colours.accent,
              }}
            />
          ) : null;
          return (
            <View
              key={key}
              role="row"
              style={[
                line,
                {
                  minHeight: desk ? shell.rowDesk : 54,
                  paddingVertical: 4,
                  borderRadius: radius.plate,
                  backgroundColor: lifted ? colours.lift : colours.plate,
                },
              ]}
            >
              {bar}
              {cells}
            </View>
          );
        })}
      </View>
    </View>
  );
}

function SortArrow({ descending }: { descending: boolean }) {
  const { colours } = useLook();
  return (
    <View style={descending ? null : { transform: [{ rotate: '180deg' }] }}>
      <Icon name="down" size={12} colour={colours.ink0} strokeWidth={2.5} />
    </View>
  );
}
