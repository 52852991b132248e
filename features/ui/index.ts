import './stylesheet';

export { LiveRegion, useAnnounce } from './announce';
export { Button, type ButtonProps } from './button';
export { Checkbox, type CheckboxProps } from './checkbox';
export { Chip, type ChipProps } from './chip';
export { CopyButton, type CopyButtonProps } from './copy-button';
export { copyToClipboard } from './copy-to-clipboard';
export { type DataColumn, type DataRow, DataTable, type DataTableProps } from './data-table';
export { type DefinitionRow, DefinitionRows, type DefinitionRowsProps } from './definition-rows';
export { DoubleRule } from './double-rule';
export { Empty, type EmptyProps } from './empty';
export { Failure, type FailureProps } from './failure';
export { Field, type FieldProps } from './field';
export { FieldFrame, type FieldFrameProps, type FieldWiring } from './field-frame';
export { followLink } from './follow-link';
export { Form, type FormProps } from './form';
export { Hairline } from './hairline';
export { Heading, type HeadingProps } from './heading';
export { Labelled, type LabelledProps } from './labelled';
export { type Layout, LayoutContainer, useContainerWidth, useLayout } from './layout';
export { LinkText, type LinkTextProps } from './link-text';
export { Main } from './main';
export { Masthead, type MastheadProps } from './masthead';
export { Menu, type MenuItem, type MenuProps } from './menu';
export { Page, type PageProps } from './page';
export { PageSkeleton, type PageSkeletonProps, useTakesLong, Waiting, type WaitingProps } from './page-skeleton';
export type { Place } from './place-link';
export { PlacesBar } from './places-bar';
export { Popover, type PopoverProps } from './popover';
export { RadioGroup, type RadioGroupProps, type RadioOption } from './radio-group';
export { Select, type SelectOption, type SelectProps } from './select';
export { Sheet, type SheetProps } from './sheet';
export { SkipLink } from './skip-link';
export { StaffLines, type StaffLinesProps } from './staff-lines';
export { Strip, type StripProps } from './strip';
export { type Tab, Tabs, type TabsProps } from './tabs';
export { Text, type TextProps } from './text';
export { TextArea, type TextAreaProps } from './text-area';
export { TextButton, type TextButtonProps } from './text-button';
export { type ThemeChoice, useThemeChoice } from './theme-choice';
export { ThemeSwitch } from './theme-switch';
export {
  breakpoint,
  colour,
  contentWidth,
  font,
  series,
  space,
  staffSpace,
  type TextSize,
  type Tone,
  touchTarget,
} from './tokens';
export { type FuseClass, useFuse } from './use-fuse';
export { usePageKeys } from './use-page-keys';
export { useTypingMark } from './use-typing-mark';
export { web } from './web';
export { Wordmark } from './wordmark';
