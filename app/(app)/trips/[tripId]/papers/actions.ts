"use server";

import { revalidatePath } from "next/cache";
import { newId } from "@/lib/domain/new-id";
import { planSendInput, sendInput, templateInput } from "@/lib/domain/post/schema";
import { AppError, toAppError } from "@/lib/errors";
import { formatInstant } from "@/lib/format/days";
import { plural } from "@/lib/format/words";
import { action } from "@/lib/http/action";
import type { Context } from "@/lib/services/context/context";
import { planSend } from "@/lib/services/planned-sends/plan-send";
import { sendPapers } from "@/lib/services/post/send-papers";
import { saveTemplate } from "@/lib/services/templates/save-template";
import { getTrip } from "@/lib/services/trips/get-trip";

type Input = Readonly<Record<string, unknown>>;

async function sendTest(ctx: Context, input: Input): Promise<string> {
  // A test is looked at, changed and sent again: each press is a request of its own.
  await sendPapers({ ctx, input: sendInput.parse({ ...input, requestId: newId() }), isTest: true });
  return "A test is on its way to you.";
}

async function planForLater(ctx: Context, input: Input): Promise<string> {
  const { sendAt } = await planSend({ ctx, input: planSendInput.parse(input) });
  const { timeZone } = await getTrip({ ctx, input: { tripId: String(input.tripId) } });
  return `It goes out on ${formatInstant(sendAt, timeZone)}. Post shows it until then.`;
}

/** The form calls the fields otherwise than the template does. */
async function keepTemplate(ctx: Context, input: Input): Promise<string> {
  try {
    const { tripId, templateName: name, subject, message: body } = input;
    await saveTemplate({ ctx, input: templateInput.parse({ tripId, name, subject, body }) });
  } catch (error) {
    const refusal = toAppError(error);
    if (!refusal) throw error;
    const { name, body, ...rest } = refusal.fieldErrors;
    const fieldErrors = { ...rest, ...(name ? { templateName: name } : {}), ...(body ? { message: body } : {}) };
    throw new AppError(refusal.code, refusal.userMessage, { fieldErrors });
  }
  return "Kept. It stands among the words to start from.";
}

async function sendNow(ctx: Context, input: Input): Promise<string> {
  const { messageCount } = await sendPapers({ ctx, input: sendInput.parse(input) });
  return `${plural(messageCount, "message is", "messages are")} on the way. Post shows how they fare.`;
}

const WAYS: Readonly<Record<string, (ctx: Context, input: Input) => Promise<string>>> = {
  test: sendTest,
  later: planForLater,
  template: keepTemplate,
};

export const sendPapersAction = action(async ({ ctx, input }) => {
  const way = typeof input.intent === "string" && Object.hasOwn(WAYS, input.intent) ? WAYS[input.intent] : undefined;
  const message = await (way ?? sendNow)(ctx, input);
  revalidatePath(`/trips/${String(input.tripId)}`, "layout");
  return { message };
});
