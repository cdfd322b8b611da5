import { chakra } from '@chakra-ui/react/styled-system';
import type { ComponentProps, MouseEvent } from 'react';
import { RouterLink } from './router-link.js';
import { recipes } from './theme/recipes.js';

const ButtonElement = chakra('button', recipes.button);
const RouterLinkElement = chakra(RouterLink, recipes.button);
const AnchorElement = chakra('a', recipes.button);

export interface ButtonProps extends ComponentProps<typeof ButtonElement> {
  /** Work is on its way: presses are ignored, the focus stays where it is. */
  isBusy?: boolean;
  /** What is said meanwhile: "Saving …". */
  busyWords?: string;
}

/** A verb. `look`: ink (the main one), outline, stop (ends or throws away), plain (underlined), cell (title block). */
export function Button({ isBusy, busyWords, children, onClick, type = 'button', ...rest }: ButtonProps) {
  const press = (event: MouseEvent<HTMLButtonElement>) => {
    if (isBusy) event.preventDefault();
    else onClick?.(event);
  };
  return (
    <ButtonElement
      type={type}
      aria-disabled={isBusy || undefined}
      aria-busy={isBusy}
      onClick={press}
      {...rest}
    >
      {isBusy && busyWords ? busyWords : children}
    </ButtonElement>
  );
}

/** A link within the shop that looks like a button. */
export const LinkButton = (props: ComponentProps<typeof RouterLinkElement>) => (
  <RouterLinkElement {...props} />
);

/** A link that leaves the application: a download, the payment page. */
export const AnchorButton = (props: ComponentProps<typeof AnchorElement>) => <AnchorElement {...props} />;
