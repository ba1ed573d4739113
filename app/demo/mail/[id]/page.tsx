import type { Metadata } from "next";
import Link from "next/link";
import { PageHeading } from "@/components/ui/layout";
import { orNotFound } from "@/lib/http/or-not-found";
import { getCapturedMail } from "@/lib/services/post/read-captured-mail";

export const metadata: Metadata = { title: "Mail of this demo" };
export const dynamic = "force-dynamic";

interface DemoMailProps {
  readonly params: Promise<{ id: string }>;
}

/** Links of a plain text, so that they can be followed. */
function withLinks(text: string) {
  return text.split(/(https?:\/\/[^\s<>"]+)/).map((part, index) =>
    index % 2 === 1 ? (
      <a key={index} href={part} className="break-all text-spruce underline">
        {part}
      </a>
    ) : (
      part
    ),
  );
}

export default async function DemoMail({ params }: DemoMailProps) {
  const { id } = await params;
  const mail = await orNotFound(getCapturedMail({ input: { id } }));
  return (
    <>
      <PageHeading title={mail.subject} lead={`From ${mail.fromText} to ${mail.toAddress}`} />
      <div className="max-w-[46rem] rounded-sheet border border-hair bg-sheet p-5 break-words whitespace-pre-wrap">
        {withLinks(mail.text)}
      </div>
      {mail.files.length > 0 && (
        <ul className="mt-6">
          {mail.files.map((file, index) => (
            <li key={index}>
              <a
                href={`/demo/mail/${mail.id}/${index}`}
                className="inline-flex min-h-11 items-center text-spruce underline"
              >
                {file.fileName} ({Math.ceil(file.sizeBytes / 1024)} kB)
              </a>
            </li>
          ))}
        </ul>
      )}
      <p className="mt-8">
        <Link href="/demo/mail" className="inline-flex min-h-11 items-center text-spruce underline">
          All mails
        </Link>
      </p>
    </>
  );
}
