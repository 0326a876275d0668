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
  defaultOpen = false,
  children,
}: {
  trigger: ReactNode;
  label: string;
  /** True where the menu arrives only once it was asked for. */
  defaultOpen?: boolean;
  children: ReactNode;
}) {
  return (
    <MenuTrigger defaultOpen={defaultOpen}>
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
