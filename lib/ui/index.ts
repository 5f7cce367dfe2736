// The door of the design system. `LineChart` is not here: it is heavy and is loaded by next/dynamic from "@/lib/ui/line-chart".
export { ApiProblem, fetchJson, NetworkProblem, type SendOptions, sendCommand } from "./api";
export {
  Button,
  type ButtonProps,
  ButtonRow,
  type ButtonSize,
  type ButtonVariant,
  LinkButton,
  type LinkButtonProps,
} from "./button";
export {
  Checkbox,
  type CheckboxProps,
  RadioButtons,
  type RadioButtonsProps,
  type RadioOption,
} from "./choices";
export { CspNonceProvider, useCspNonce } from "./csp-nonce";
export { type DataColumn, DataTable, type DataTableProps } from "./data-table";
export { Dialog, type DialogProps } from "./dialog";
export { EmptyState, type EmptyStateProps } from "./empty-state";
export { Field, type FieldProps } from "./field";
export { fieldId } from "./field-id";
export { FormDialog, type FormDialogProps } from "./form-dialog";
export { FormError, type FormErrorProps } from "./form-error";
export { Frame, type FrameProps } from "./frame";
export { pointerToPath } from "./json-pointer";
export { LiveMessage, LiveMessageProvider, type LiveMessageValue, useLiveMessage } from "./live-message";
export { Menu, type MenuEntry, type MenuProps } from "./menu";
export { Notice, type NoticeProps } from "./notice";
export { NumberInput, type NumberInputProps } from "./number-input";
export { numberText } from "./number-text";
export { type Fact, Facts, PageHead, type PageHeadProps } from "./page-head";
export { Pager, type PagerProps } from "./pager";
export { Panel, type PanelProps } from "./panel";
export { Progress, type ProgressProps, Steps, type StepsProps } from "./progress";
export { Quantity, type QuantityProps } from "./quantity";
export { createQueryClient, QueryProvider } from "./query-provider";
export { Select, type SelectGroup, type SelectOption, type SelectProps } from "./select";
export { Hidden, KeyHint, Skeleton } from "./small-parts";
export { type StaffItem, StaffNav, type StaffNavProps } from "./staff-nav";
export {
  STATUS_WORDS,
  type StatusCode,
  type StatusDirection,
  StatusShape,
  StatusWord,
  type StatusWordProps,
} from "./status-word";
export { type TabItem, Tabs, type TabsProps } from "./tabs";
export {
  DateInput,
  type DateInputProps,
  Textarea,
  type TextareaProps,
  TextInput,
  type TextInputProps,
} from "./text-input";
export { readTheme, THEME_COOKIE, THEME_WORDS, THEMES, type Theme } from "./theme";
export { ThemeChoice, type ThemeChoiceProps } from "./theme-choice";
export { TimeText, type TimeTextProps } from "./time-text";
export { agoText, type TimeParts, timeText } from "./time-words";
export { type Crumb, TopBar, type TopBarProps } from "./top-bar";
export { type ActOptions, useAct } from "./use-act";
export { useDone } from "./use-done";
export { type ProblemForm, type ProblemFormOptions, useProblemForm } from "./use-problem-form";
export { WellStrip, type WellStripProps } from "./well-strip";
export { type WellStripInput, type WellStripScale, wellStripScale } from "./well-strip-scale";
export { wellStripText } from "./well-strip-text";
