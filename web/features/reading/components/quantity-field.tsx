import { useMemo, useState } from 'react';
import { Button, ComboBox, Input, ListBox, ListBoxItem, Popover } from 'react-aria-components';
import { FieldFrame } from '../../../components/ui/field-frame';
import { QuantitySymbol } from '../../../components/ui/quantity-symbol';
import { type Findable, findChoices } from '../lib/find-choices';

/** One of many, found by any of its names: label, trade symbol, or what workbooks call it. */
export function QuantityField<Choice extends Findable>({
  label,
  choices,
  value,
  onChange,
  error,
}: {
  label: string;
  choices: readonly Choice[];
  value: string | null;
  onChange: (id: string | null) => void;
  error?: string | undefined;
}) {
  const chosen = choices.find(({ id }) => id === value);
  const [typed, setTyped] = useState<string | null>(null);
  const shown = typed ?? chosen?.label ?? '';
  const found = useMemo(() => findChoices(choices, typed ?? ''), [choices, typed]);
  return (
    <ComboBox
      className="field"
      items={found.map(({ choice, alias }) => ({ id: choice.id, choice, alias }))}
      inputValue={shown}
      onInputChange={setTyped}
      selectedKey={value}
      onSelectionChange={(key) => {
        setTyped(null);
        if (key !== null) onChange(String(key));
      }}
      onOpenChange={(isOpen) => {
        if (!isOpen) setTyped(null);
      }}
      isInvalid={error !== undefined}
      menuTrigger="focus"
    >
      <FieldFrame label={label} error={error}>
        <span className="combo combo-wide">
          <Input className="input" />
          <Button className="combo-button">
            <svg className="select-arrow" viewBox="0 0 8 5" aria-hidden="true">
              <path d="M0 0H8L4 5Z" fill="currentColor" />
            </svg>
          </Button>
        </span>
      </FieldFrame>
      <Popover className="popover" offset={2}>
        <ListBox className="list-box">
          {({ choice, alias }: { id: string; choice: Choice; alias: string | null }) => (
            <ListBoxItem id={choice.id} textValue={choice.label} className="menu-item">
              <span>
                {choice.label} {choice.symbol ? <QuantitySymbol>{choice.symbol}</QuantitySymbol> : null}
              </span>
              {alias === null ? null : <small>written “{alias}”</small>}
              {choice.judged ? <small>judged by the section</small> : null}
            </ListBoxItem>
          )}
        </ListBox>
      </Popover>
    </ComboBox>
  );
}
