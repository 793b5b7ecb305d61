import type { IconName } from '../../components/icons';

/** A place that the navigation leads to. */
export type Place = {
  to: string;
  label: string;
  icon: IconName;
  /** `exact` when pages below it belong to another place */
  match?: 'below' | 'exact';
};
