import { TextField } from "@/components/ui/fields";

export function NewPasswordField({ label, name }: { readonly label: string; readonly name: string }) {
  return (
    <TextField
      label={label}
      name={name}
      type="password"
      autoComplete="new-password"
      required
      hint="At least 8 characters, better 15: four words in a row are easy to keep in mind."
    />
  );
}
