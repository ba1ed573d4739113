"use client";

import { useId } from "react";
import type { ComponentProps, ReactNode } from "react";
import { useFieldErrors } from "./action-form";

interface FieldShell {
  readonly name: string;
  readonly label: string;
  readonly hint?: ReactNode;
  /** Errors from elsewhere than the form around it. */
  readonly errors?: readonly string[];
}

/** The path of a field is its name without the suffix that says how it is read. */
function pathOf(name: string): string {
  return name.split(":")[0] ?? name;
}

function useField({ name, errors, hint }: Pick<FieldShell, "name" | "errors" | "hint">) {
  const id = useId();
  const formErrors = useFieldErrors(pathOf(name));
  const shown = errors ?? formErrors;
  const described = [hint ? `${id}-hint` : null, shown.length > 0 ? `${id}-error` : null].filter(Boolean).join(" ");
  return {
    id,
    shown,
    control: { id, name, "aria-invalid": shown.length > 0 || undefined, "aria-describedby": described || undefined },
  };
}

function Shell({
  id,
  label,
  hint,
  errors,
  children,
}: {
  id: string;
  label: string;
  hint?: ReactNode;
  errors: readonly string[];
  children: ReactNode;
}) {
  return (
    <div className="flex min-w-0 flex-col gap-1">
      <label htmlFor={id} className="text-15 font-semibold">
        {label}
      </label>
      {children}
      {hint && (
        <p id={`${id}-hint`} className="text-13 text-pencil">
          {hint}
        </p>
      )}
      <FieldError id={`${id}-error`} errors={errors} />
    </div>
  );
}

export function FieldError({ id, errors }: { id?: string; errors: readonly string[] }) {
  if (errors.length === 0) return null;
  return (
    <p id={id} className="text-13 font-semibold text-rowan">
      {errors.join(" ")}
    </p>
  );
}

const CONTROL =
  "min-h-11 w-full min-w-0 rounded-field border border-pencil bg-sheet px-3 py-2 text-15 text-ink placeholder:text-pencil aria-[invalid]:border-rowan";

type TextFieldProps = FieldShell & Omit<ComponentProps<"input">, "name">;

export function TextField({ label, hint, errors, name, className = "", ...rest }: TextFieldProps) {
  const field = useField({ name, errors, hint });
  return (
    <Shell id={field.id} label={label} hint={hint} errors={field.shown}>
      <input type="text" {...rest} {...field.control} className={`${CONTROL} ${className}`} />
    </Shell>
  );
}

type NumberFieldProps = TextFieldProps & { readonly unit?: string };

/** A decimal number, point or comma; the unit stands at the field. `name` gets the suffix ":number". */
export function NumberField({ label, hint, errors, name, unit, className = "", ...rest }: NumberFieldProps) {
  const field = useField({ name: `${name}:number`, errors, hint });
  return (
    <Shell id={field.id} label={unit ? `${label}, ${unit}` : label} hint={hint} errors={field.shown}>
      <input
        type="text"
        inputMode="decimal"
        autoComplete="off"
        {...rest}
        {...field.control}
        className={`${CONTROL} ${className}`}
      />
    </Shell>
  );
}

export function TextArea({
  label,
  hint,
  errors,
  name,
  className = "",
  ...rest
}: FieldShell & Omit<ComponentProps<"textarea">, "name">) {
  const field = useField({ name, errors, hint });
  return (
    <Shell id={field.id} label={label} hint={hint} errors={field.shown}>
      <textarea rows={4} {...rest} {...field.control} className={`${CONTROL} ${className}`} />
    </Shell>
  );
}

export interface Option {
  readonly value: string;
  readonly label: string;
}

export function SelectField({
  label,
  hint,
  errors,
  name,
  options,
  placeholder,
  className = "",
  ...rest
}: FieldShell &
  Omit<ComponentProps<"select">, "name" | "children"> & {
    readonly options: readonly Option[];
    /** A first, empty choice: "not said yet". */
    readonly placeholder?: string;
  }) {
  const field = useField({ name, errors, hint });
  return (
    <Shell id={field.id} label={label} hint={hint} errors={field.shown}>
      <select {...rest} {...field.control} className={`${CONTROL} ${className}`}>
        {placeholder !== undefined && <option value="">{placeholder}</option>}
        {options.map((option) => (
          <option key={option.value} value={option.value}>
            {option.label}
          </option>
        ))}
      </select>
    </Shell>
  );
}

/** One tick box; sends "true" or "false" under `name:boolean`. */
export function CheckField({
  label,
  hint,
  name,
  ...rest
}: Omit<FieldShell, "errors"> & Omit<ComponentProps<"input">, "name" | "type">) {
  const field = useField({ name: `${name}:boolean`, hint });
  return (
    <div className="flex flex-col gap-1">
      <label className="flex min-h-11 items-center gap-3">
        <input type="hidden" name={`${name}:boolean`} value="false" />
        <input type="checkbox" value="true" {...rest} {...field.control} className="size-5 shrink-0 accent-spruce" />
        <span>{label}</span>
      </label>
      {hint && (
        <p id={`${field.id}-hint`} className="pl-8 text-13 text-pencil">
          {hint}
        </p>
      )}
      <FieldError id={`${field.id}-error`} errors={field.shown} />
    </div>
  );
}

/** One of a few, each visible. */
export function ChoiceField({
  legend,
  name,
  options,
  defaultValue,
  hint,
  onChange,
}: {
  readonly legend: string;
  readonly name: string;
  readonly options: readonly (Option & { readonly detail?: string })[];
  readonly defaultValue?: string | undefined;
  readonly hint?: ReactNode;
  readonly onChange?: (value: string) => void;
}) {
  const field = useField({ name, hint });
  return (
    <fieldset aria-describedby={field.control["aria-describedby"]} className="flex min-w-0 flex-col gap-1">
      <legend className="mb-1 text-15 font-semibold">{legend}</legend>
      <div className="flex flex-wrap gap-2">
        {options.map((option) => (
          <label
            key={option.value}
            className="flex min-h-11 items-center gap-2 rounded-field border border-hair bg-sheet px-3 py-2 has-checked:border-spruce has-checked:bg-spruce-wash"
          >
            <input
              type="radio"
              name={name}
              value={option.value}
              defaultChecked={option.value === defaultValue}
              onChange={onChange && (() => onChange(option.value))}
              className="size-4 shrink-0 accent-spruce"
            />
            <span>
              {option.label}
              {option.detail && <span className="block text-13 text-pencil">{option.detail}</span>}
            </span>
          </label>
        ))}
      </div>
      {hint && (
        <p id={`${field.id}-hint`} className="text-13 text-pencil">
          {hint}
        </p>
      )}
      <FieldError id={`${field.id}-error`} errors={field.shown} />
    </fieldset>
  );
}
