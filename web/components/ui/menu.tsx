import type { ReactNode } from 'react';
import {
  Menu as AriaMenu,
  MenuItem as AriaMenuItem,
  type MenuItemProps,
  MenuTrigger,
  Popover,
} from 'react-aria-components';

/** A button that opens a list of acts; paper with an ink edge, no shadow. */
export function Menu({
  trigger,
  label,
  children,
}: {
  trigger: ReactNode;
  label: string;
  children: ReactNode;
}) {
  return (
    <MenuTrigger>
      {trigger}
      <Popover className="popover" offset={6} placement="bottom end">
        <AriaMenu className="menu" aria-label={label}>
          {children}
        </AriaMenu>
      </Popover>
    </MenuTrigger>
  );
}

export function MenuItem({ children, ...props }: MenuItemProps & { children: ReactNode }) {
  return (
    <AriaMenuItem {...props} className="menu-item">
      {children}
    </AriaMenuItem>
  );
}
