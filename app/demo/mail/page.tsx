import type { Metadata } from "next";
import Link from "next/link";
import { EmptyState, PageHeading } from "@/components/ui/layout";
import { orNotFound } from "@/lib/http/or-not-found";
import { listCapturedMail } from "@/lib/services/post/read-captured-mail";

export const metadata: Metadata = { title: "Mails of this demo" };
export const dynamic = "force-dynamic";

const when = new Intl.DateTimeFormat("en-GB", { dateStyle: "medium", timeStyle: "medium", timeZone: "UTC" });

export default async function DemoMailPage() {
  const mails = await orNotFound(listCapturedMail());
  return (
    <>
      <PageHeading
        title="Mails of this demo"
        lead="No mail server is set, so nothing leaves this machine. Every message is kept here, the newest first."
      />
      {mails.length === 0 ? (
        <EmptyState title="No mail yet">
          <p>Send papers, invite somebody or make an account: the message appears here after a second or two.</p>
        </EmptyState>
      ) : (
        <ul className="divide-y divide-hair border-y border-hair">
          {mails.map((mail) => (
            <li key={mail.id}>
              <Link
                href={`/demo/mail/${mail.id}`}
                className="flex min-h-11 flex-wrap justify-between gap-x-6 px-2 py-3 hover:bg-spruce-wash"
              >
                <span className="min-w-0 break-words">
                  <span className="font-semibold">{mail.subject}</span>
                  <span className="block text-13 text-pencil">to {mail.toAddress}</span>
                </span>
                <span className="text-13 text-pencil tabular-nums">{when.format(new Date(mail.receivedAt))} UTC</span>
              </Link>
            </li>
          ))}
        </ul>
      )}
    </>
  );
}
