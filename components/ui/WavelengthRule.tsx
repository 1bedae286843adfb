import { View } from 'react-native';
import Svg, { Path, Rect, Text as SvgText } from 'react-native-svg';
import { fontFamily, shell } from './tokens';
import { Text } from './Text';
import { useLook } from './useLook';
import { wavelengthTicks, wavelengthX } from './wavelengthScale';

export interface WavelengthRuleProps {
  /** Of the bench's laser in air; null: no mark. */
  wavelengthNm: number | null;
  /** Beside the rule on a phone. */
  benchLabel?: string | null;
}

/** Top edge of every screen: 380 to 720 nm across the width, with one mark where the laser is. */
export function WavelengthRule({ wavelengthNm, benchLabel }: WavelengthRuleProps) {
  const { colours, desk, widthPx, theme } = useLook();
  const margin = desk ? 24 : 16;
  const x = wavelengthNm === null ? null : wavelengthX(wavelengthNm, widthPx, margin);
  const toTheLeft = x !== null && (desk ? x > widthPx - 110 : x > widthPx * 0.6);
  const number = wavelengthNm === null ? null : `${Number(wavelengthNm.toFixed(2))}\u2009nm`;
  const text = theme === 'light' ? colours.ink0 : colours.accent;
  return (
    <View
      role="img"
      aria-label={number ? `Laser ${number}${benchLabel ? `, ${benchLabel}` : ''}` : 'Wavelength rule, no bench chosen'}
      style={{ height: desk ? shell.ruleDesk : shell.rule, backgroundColor: colours.gap, overflow: 'hidden' }}
    >
      <Svg width={widthPx} height={shell.rule} aria-hidden>
        <Path
          d={wavelengthTicks(widthPx, margin, desk ? 2 : 5, wavelengthNm)}
          stroke={colours.ink3}
          strokeWidth={1}
          opacity={wavelengthNm === null ? 0.55 : 0.75}
        />
        {desk
          ? [400, 450, 500, 550, 600, 650, 700]
              .filter((nm) => wavelengthNm === null || nm - wavelengthNm <= -14 || nm - wavelengthNm >= 32)
              .map((nm) => (
                <SvgText
                  key={nm}
                  x={wavelengthX(nm, widthPx, margin)}
                  y={23}
                  textAnchor="middle"
                  fontFamily={fontFamily.text}
                  fontSize={12}
                  fill={colours.ink2}
                >
                  {nm}
                </SvgText>
              ))
          : null}
        {x !== null ? (
          <>
            <Rect x={x - 1.75} y={0} width={3.5} height={26} fill={colours.accent} />
            <SvgText
              x={toTheLeft ? x - 9 : x + 9}
              y={25}
              textAnchor={toTheLeft ? 'end' : 'start'}
              fontFamily={fontFamily.textBold}
              fontSize={14}
              fill={text}
            >
              {number}
            </SvgText>
          </>
        ) : null}
      </Svg>
      {!desk && benchLabel ? (
        <View style={{ position: 'absolute', left: 16, bottom: -1, maxWidth: '38%' }} aria-hidden>
          <Text variant="small" tone="ink2" lines={1}>
            {benchLabel}
          </Text>
        </View>
      ) : null}
    </View>
  );
}
