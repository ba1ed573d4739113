import { and, eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { makeCast } from "../../helpers/actors";
import { makeCampKit } from "../../helpers/camp-kit";
import { codeOf, refusalOf } from "../../helpers/refusals";
import { getDb } from "@/db/client";
import { outboxMessage } from "@/db/schema";
import { findMentions } from "@/lib/domain/comment/find-mentions";
import { newId } from "@/lib/domain/ids";
import type { Context } from "@/lib/services/context/context";
import { createComment } from "@/lib/services/comments/create-comment";
import { deleteComment } from "@/lib/services/comments/delete-comment";
import { listComments } from "@/lib/services/comments/list-comments";

let cast: Awaited<ReturnType<typeof makeCast>>;
let kit: Awaited<ReturnType<typeof makeCampKit>>;
const one = <Input extends object>(input: Input) => ({ tripId: cast.tripId, ...input });
const camp = () => ({ about: "camp" as const, campId: kit.campId });
const shelter = () => ({ about: "shelter" as const, shelterId: kit.shelterId });

const write = (ctx: Context, body: string, commentId = newId(), subject: object = camp()) =>
  createComment({ ctx, input: one({ commentId, subject: subject as ReturnType<typeof camp>, body }) });
const list = (ctx: Context, subject: object = camp()) =>
  listComments({ ctx, input: one({ subject: subject as ReturnType<typeof camp> }) });
const mails = () =>
  getDb()
    .select()
    .from(outboxMessage)
    .where(and(eq(outboxMessage.tripId, cast.tripId), eq(outboxMessage.kind, "comment")));

beforeEach(async () => {
  cast = await makeCast();
  kit = await makeCampKit(cast.leader.ctx, cast.tripId);
});

describe("comments", () => {
  it("are read by leader and co-leader, on a camp and on a shelter apart", async () => {
    await write(cast.leader.ctx, "Wet at the wall.");
    await write(cast.coLeader.ctx, "Pole is bent.", newId(), shelter());
    const { comments } = await list(cast.coLeader.ctx);
    expect(comments).toMatchObject([{ body: "Wet at the wall.", byName: cast.leader.name, isDeletable: false }]);
    expect((await list(cast.leader.ctx, shelter())).comments).toMatchObject([
      { body: "Pole is bent.", isDeletable: true },
    ]);
  });

  it("are kept from participants and strangers, whether they read or write", async () => {
    await write(cast.leader.ctx, "Not for everybody.");
    for (const [who, code] of [
      ["participant", "forbidden"],
      ["stranger", "not-found"],
      ["otherLeader", "not-found"],
    ] as const) {
      expect(await codeOf(list(cast[who].ctx))).toBe(code);
      expect(await codeOf(write(cast[who].ctx, "Me too."))).toBe(code);
    }
    expect((await list(cast.leader.ctx)).comments).toHaveLength(1);
  });

  it("mail those called by name, once, and nobody else", async () => {
    const id = newId();
    const body = `@${cast.coLeader.name} look at tie-out 3. @${cast.participant.name} @Nobody`;
    expect(await write(cast.leader.ctx, body, id)).toEqual({ mentionCount: 1 });
    expect(await write(cast.leader.ctx, body, id)).toEqual({ mentionCount: 1 });
    const sent = await mails();
    expect(sent).toHaveLength(1);
    expect(sent[0]).toMatchObject({ toAddress: cast.coLeader.email, replyToAddress: cast.leader.email });
    expect(sent[0]?.text).toContain("look at tie-out 3");
    expect(sent[0]?.text).toContain(`/trips/${cast.tripId}/camps/${kit.campId}/comments`);
    expect((await list(cast.leader.ctx)).comments).toHaveLength(1);
  });

  it("are deleted by their writer or the leader", async () => {
    const [ofLeader, ofCoLeader] = [newId(), newId()];
    await write(cast.leader.ctx, "Mine.", ofLeader);
    await write(cast.coLeader.ctx, "Theirs.", ofCoLeader);
    const drop = (ctx: Context, commentId: string) => deleteComment({ ctx, input: one({ commentId }) });
    expect(await codeOf(drop(cast.coLeader.ctx, ofLeader))).toBe("forbidden");
    expect(await codeOf(drop(cast.participant.ctx, ofCoLeader))).toBe("forbidden");
    await drop(cast.leader.ctx, ofCoLeader);
    await drop(cast.leader.ctx, ofLeader);
    expect(await codeOf(drop(cast.leader.ctx, ofLeader))).toBe("not-found");
    expect((await list(cast.leader.ctx)).comments).toEqual([]);
  });

  it("refuse bad input with the field, and write nothing", async () => {
    const { ctx } = cast.leader;
    expect(await refusalOf(write(ctx, " \n "))).toMatchObject({ fieldErrors: { body: ["Write the comment first."] } });
    expect(await codeOf(write(ctx, "x".repeat(2001)))).toBe("bad-input");
    expect(await codeOf(write(ctx, "x".repeat(50_000)))).toBe("bad-input");
    expect(await codeOf(write(ctx, "Hm.", "short"))).toBe("bad-input");
    expect(await codeOf(write(ctx, "Hm.", newId(), { about: "kit", campId: kit.campId }))).toBe("bad-input");
    expect(await codeOf(write(ctx, "Hm.", newId(), { about: "camp", campId: newId() }))).toBe("not-found");
    const foreign = await makeCampKit(cast.otherLeader.ctx, cast.otherTripId);
    expect(await codeOf(write(ctx, "Hm.", newId(), { about: "camp", campId: foreign.campId }))).toBe("not-found");
    expect(await codeOf(write(ctx, "Hm.", newId(), { about: "shelter", shelterId: foreign.shelterId }))).toBe(
      "not-found",
    );
    expect((await list(ctx)).comments).toEqual([]);
  });

  it("do not answer for an id that somebody else used", async () => {
    const id = newId();
    await write(cast.leader.ctx, "First.", id);
    expect(await codeOf(write(cast.coLeader.ctx, "Second.", id))).toBe("conflict");
  });
});

describe("calling by name", () => {
  const people = [
    { id: "a", name: "Tobi Oduya" },
    { id: "b", name: "Tobias Holm" },
    { id: "c", name: "Łucja Żółtowska" },
    { id: "d", name: "Ann Lee" },
    { id: "e", name: "Ann Moss" },
  ];
  const ids = (body: string) => findMentions(body, people).map((one) => one.personId);

  it("takes whole names, and first names that only one has", () => {
    expect(ids("@Tobi please")).toEqual(["a"]);
    expect(ids("@tobi oduya, @ŁUCJA.")).toEqual(["a", "c"]);
    expect(ids("@Ann?")).toEqual([]);
    expect(ids("@Ann Moss!")).toEqual(["e"]);
  });

  it("takes no longer word and no mail address for a name", () => {
    expect(ids("@Tobiasson")).toEqual([]);
    expect(ids("mail@tobi.example")).toEqual([]);
    expect(ids("Tobi")).toEqual([]);
  });
});
