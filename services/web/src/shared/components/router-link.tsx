import { Button, Link, type ButtonProps, type LinkProps } from '@fluentui/react-components';
import type { ReactNode } from 'react';
import { useHref, useLinkClickHandler, type To } from 'react-router-dom';

interface RouterLinkProps extends Pick<LinkProps, 'appearance' | 'className' | 'inline' | 'aria-label'> {
  to: To;
  children: ReactNode;
}

/** A Fluent link that changes the page without loading it again; opens in a new tab like any other link. */
export function RouterLink({ to, children, ...props }: RouterLinkProps) {
  const href = useHref(to);
  const onClick = useLinkClickHandler(to);
  return (
    <Link as="a" href={href} onClick={onClick} {...props}>
      {children}
    </Link>
  );
}

interface LinkButtonProps {
  to: To;
  children: ReactNode;
  appearance?: ButtonProps['appearance'];
  size?: ButtonProps['size'];
  icon?: ButtonProps['icon'];
  className?: string;
}

/** A link that looks like a button, for the one thing that a page leads to. */
export function LinkButton({ to, children, ...props }: LinkButtonProps) {
  const href = useHref(to);
  const onClick = useLinkClickHandler(to);
  return (
    <Button as="a" href={href} onClick={onClick} {...props}>
      {children}
    </Button>
  );
}
