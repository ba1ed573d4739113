import { TextField } from "@/components/ui/fields";

export function NewPasswordField({
  label,
  name,
  isOptional = false,
}: {
  readonly label: string;
  readonly name: string;
  /** Who leaves it empty signs in by links. */
  readonly isOptional?: boolean;
}) {
  const hint = "At least 8 characters, better 15: four words in a row are easy to keep in mind.";
  return (
    <TextField
      label={label}
      name={name}
      type="password"
      autoComplete="new-password"
      required={!isOptional}
      hint={isOptional ? `${hint} Leave it empty to sign in by a link to your address each time.` : hint}
    />
  );
}
