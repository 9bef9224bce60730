import { Badge } from '@fluentui/react-components';

/** Stands wherever a weather year that Noonwell made itself is named. */
export function SyntheticBadge() {
  return (
    <Badge appearance="tint" color="warning" title="Made by Noonwell for an invented place; not measured">
      Synthetic
    </Badge>
  );
}
