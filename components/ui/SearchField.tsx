import { useState } from 'react';
import { TextInput, View, type StyleProp, type ViewStyle } from 'react-native';
import { Icon } from './Icon';
import { IconButton } from './IconButton';
import { fontFamily, radius, stroke, target } from './tokens';
import { useLook } from './useLook';
import { webProps } from './webProps';

export interface SearchFieldProps {
  label: string;
  placeholder: string;
  value: string;
  onChange: (value: string) => void;
  style?: StyleProp<ViewStyle>;
}

/** A sunk plate with a glass: narrows what stands below or beside it as one types. */
export function SearchField({ label, placeholder, value, onChange, style }: SearchFieldProps) {
  const { colours, desk } = useLook();
  const [focused, setFocused] = useState(false);
  return (
    <View
      {...webProps({ role: 'search' })}
      style={[
        {
          minHeight: target.min,
          flexDirection: 'row',
          alignItems: 'center',
          gap: 10,
          paddingLeft: 14,
          backgroundColor: colours.well,
          borderRadius: radius.plate,
        },
        style,
      ]}
    >
      <Icon name="search" size={18} colour={colours.ink2} />
      <TextInput
        value={value}
        onChangeText={onChange}
        onFocus={() => setFocused(true)}
        onBlur={() => setFocused(false)}
        placeholder={placeholder}
        placeholderTextColor={colours.ink2}
        aria-label={label}
        autoCorrect={false}
        autoCapitalize="none"
        {...webProps({ type: 'search', enterKeyHint: 'search' })}
        style={{
          flex: 1,
          minWidth: 0,
          minHeight: target.min - 8,
          padding: 0,
          color: colours.ink0,
          fontFamily: fontFamily.text,
          fontSize: desk ? 14 : 16,
        }}
      />
      {value === '' ? null : <IconButton icon="close" label="Clear the search" onPress={() => onChange('')} />}
      <View
        style={{
          position: 'absolute',
          left: 0,
          right: 0,
          bottom: 0,
          height: stroke.line,
          backgroundColor: focused ? colours.accent : colours.ink3,
        }}
      />
    </View>
  );
}
