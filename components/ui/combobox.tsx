'use client';

import type { ReactNode } from 'react';
import {
  Button as AriaButton,
  ComboBox,
  FieldError as AriaFieldError,
  Input,
  Label,
  ListBox,
  ListBoxItem,
  Popover,
  Text,
} from 'react-aria-components';
import { classes } from './classes';
import { fieldBox } from './field';
import { Icon } from './icon';
import { Sign } from './sign';

export type ComboboxOption = {
  id: string;
  /** What is typed against and shown in the field. */
  text: string;
  /** Second line of the row. */
  detail?: ReactNode;
  /** Left of the row: a drawing or a mark. */
  drawing?: ReactNode;
  /** Right of the row, such as a value or a stock count. */
  aside?: ReactNode;
  disabled?: boolean;
};

export type ComboboxProps = {
  label: ReactNode;
  labelHidden?: boolean;
  hint?: ReactNode;
  error?: string | undefined;
  options: readonly ComboboxOption[];
  value?: string | null;
  defaultValue?: string;
  onChange?: (id: string | null) => void;
  /** Called as the person types; give it when the options come from a search. Without it the list is filtered here. */
  onSearch?: (text: string) => void;
  placeholder?: string;
  /** The sentence of an empty list: say what else can be typed. */
  empty?: ReactNode;
  name?: string;
  size?: 'desk' | 'floor';
  className?: string;
};

export function Combobox(props: ComboboxProps) {
  const { label, labelHidden = false, hint, error, options, value, defaultValue, onChange, onSearch } = props;
  const { placeholder, empty = 'Nothing matches. Try fewer letters.', name, size = 'desk', className } = props;
  const hasError = error !== undefined && error !== '';
  return (
    <ComboBox
      {...(onSearch ? { items: options, onInputChange: onSearch } : { defaultItems: options })}
      {...(value !== undefined && { selectedKey: value })}
      {...(defaultValue !== undefined && { defaultSelectedKey: defaultValue })}
      {...(onChange && { onSelectionChange: (key) => onChange(key === null ? null : String(key)) })}
      {...(name !== undefined && { name })}
      isInvalid={hasError}
      menuTrigger="focus"
      allowsEmptyCollection
      className={classes('flex min-w-0 flex-col', className)}
    >
      <Label className={labelHidden ? 'sr-only' : 'mb-1 font-bold'}>{label}</Label>
      {hint !== undefined && (
        <Text slot="description" className="mb-1.5 text-caption text-ink2">
          {hint}
        </Text>
      )}
      <span className={fieldBox(hasError, size)}>
        <Input
          {...(placeholder !== undefined && { placeholder })}
          className="min-w-0 flex-1 self-stretch bg-transparent px-3 text-inherit text-ink outline-none focus-visible:outline-none"
        />
        <AriaButton className="grid w-10 shrink-0 place-items-center self-stretch text-ink2">
          <Icon name="open" size={18} />
        </AriaButton>
      </span>
      <AriaFieldError className="mt-1.5 flex gap-2 text-caption font-semibold text-crimson">
        <Sign kind="stops" size={16} className="mt-0.5" />
        <span>{error}</span>
      </AriaFieldError>
      <Popover className="w-(--trigger-width) min-w-64 overflow-auto rounded-panel border border-ink bg-card shadow-lift">
        <ListBox<ComboboxOption>
          className="max-h-80 overflow-auto outline-none"
          renderEmptyState={() => <p className="px-4 py-3 text-ink2">{empty}</p>}
        >
          {(option) => (
            <ListBoxItem
              id={option.id}
              textValue={option.text}
              isDisabled={option.disabled ?? false}
              className="flex min-h-target cursor-pointer items-center gap-3 px-4 py-2 outline-none disabled:text-ink2 data-[focused]:bg-enamel-wash data-[focused]:shadow-[inset_4px_0_0_var(--enamel)]"
            >
              {option.drawing}
              <span className="min-w-0 flex-1">
                <Text slot="label" className="block font-semibold">
                  {option.text}
                </Text>
                {option.detail !== undefined && (
                  <Text slot="description" className="block text-caption text-ink2">
                    {option.detail}
                  </Text>
                )}
              </span>
              {option.aside}
            </ListBoxItem>
          )}
        </ListBox>
      </Popover>
    </ComboBox>
  );
}
