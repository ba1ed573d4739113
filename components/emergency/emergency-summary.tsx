import type { ReactNode } from "react";
import type { EmergencyPlanView } from "@/lib/domain/people-views";

/** The plan as it is read when it is needed: times first. */
export function EmergencySummary({ plan }: { readonly plan: EmergencyPlanView }) {
  return (
    <div className="grid gap-x-12 gap-y-8 lg:grid-cols-[minmax(0,1.3fr)_minmax(0,1fr)]">
      <section>
        <h2 className="border-b border-hair pb-2 text-18 font-bold">If nobody has heard from the group</h2>
        {plan.steps.length === 0 && <p className="mt-3 text-15 text-ember">No steps are written yet.</p>}
        <ol>
          {plan.steps.map((step, index) => (
            <li
              key={`${index} ${step.who}`}
              className="grid gap-x-4 border-b border-hair py-3 sm:grid-cols-[13rem_minmax(0,1fr)]"
            >
              <p className="text-15 font-bold tabular-nums">{step.at ?? `${step.afterMinutes} min after`}</p>
              <div className="min-w-0">
                <p className="text-15 break-words">{step.action}</p>
                <p className="text-15 font-semibold break-words">
                  {step.who}
                  {step.phone && <Call phone={step.phone} />}
                </p>
              </div>
            </li>
          ))}
        </ol>
      </section>
      <div className="flex flex-col gap-6">
        <Part title="Contact outside">
          {plan.outsideName || <span className="text-ember">nobody named yet</span>}
          {plan.outsidePhone && <Call phone={plan.outsidePhone} />}
          {plan.outsideEmail && <span className="block text-13 break-all text-pencil">{plan.outsideEmail}</span>}
        </Part>
        <Part title="Telephone of the group">
          {plan.groupPhone ? <Call phone={plan.groupPhone} /> : <span className="text-pencil">none</span>}
        </Part>
        <Part title="Meeting points">{plan.meetingPoints || <span className="text-ember">not written yet</span>}</Part>
        <Part title="Way out">{plan.wayOut || <span className="text-ember">not written yet</span>}</Part>
      </div>
    </div>
  );
}

function Part({ title, children }: { readonly title: string; readonly children: ReactNode }) {
  return (
    <section>
      <h2 className="text-13 text-pencil">{title}</h2>
      <div className="text-15 break-words whitespace-pre-wrap">{children}</div>
    </section>
  );
}

function Call({ phone }: { readonly phone: string }) {
  return (
    <a
      href={`tel:${phone.replace(/[^+0-9]/g, "")}`}
      className="ml-2 inline-flex min-h-11 items-center font-semibold text-spruce tabular-nums"
    >
      {phone}
    </a>
  );
}
