import { z } from "zod";
import { idSchema } from "../ids";
import { personNameSchema } from "../person/schema";
import { emailSchema } from "../text";

const passwordSchema = z
  .string({ error: "Enter your password." })
  .min(1, "Enter your password.")
  .max(128, "Use at most 128 characters.");
const newPasswordSchema = z
  .string({ error: "Enter a password." })
  .min(8, "Use at least 8 characters; 15 or more are better.")
  .max(128, "Use at most 128 characters.");
const tokenSchema = z
  .string({ error: "The link is not complete." })
  .min(1, "The link is not complete.")
  .max(2000, "The link is not complete.");

export const signInFormSchema = z.object({ email: emailSchema, password: passwordSchema });
export const signUpFormSchema = z.object({ name: personNameSchema, email: emailSchema, password: newPasswordSchema });
export const emailFormSchema = z.object({ email: emailSchema });
export const tokenFormSchema = z.object({ token: tokenSchema });
export const newPasswordFormSchema = z.object({ token: tokenSchema, password: newPasswordSchema });
/** Without a password one signs in by links sent to one's address. */
export const signUpWithInvitationFormSchema = z.object({
  token: tokenSchema,
  name: personNameSchema,
  password: z.union([z.literal(""), newPasswordSchema]).default(""),
});
export const sessionRefInput = z.object({ sessionId: idSchema });
export const nameFormSchema = z.object({ name: personNameSchema });
export const changePasswordFormSchema = z.object({ currentPassword: passwordSchema, newPassword: newPasswordSchema });
export const deleteAccountFormSchema = z.object({ password: passwordSchema });
/** Who signs in by links has no password to type. */
export const deleteAccountWithoutPasswordSchema = z.object({});
