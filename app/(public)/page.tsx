import Link from "next/link";
import { ButtonLink } from "@/components/ui/button";
import { Tape } from "@/components/ui/tape";
import { currentUser } from "@/lib/auth/current-user";
import { checkConnection } from "@/lib/core/electrics";
import { paths } from "@/lib/paths";
import { connectionRequestSchema } from "@/lib/schemas/connection";
import { exampleRequest, START } from "./_components/example-lead";
import { LiveExample } from "./_components/live-example";

export default async function HomePage() {
  const user = await currentUser();
  const first = checkConnection(connectionRequestSchema.parse(exampleRequest(START)));
  return (
    <div className="flex flex-col gap-12">
      <section className="flex flex-col items-start gap-5">
        <h1 className="flex flex-col items-start gap-2">
          <Tape size="large">Which pad fires which voice,</Tape>
          <Tape size="large" className="md:ml-10">and will it survive?</Tape>
        </h1>
        <p className="max-w-prose text-lg">
          You built the pads, the trigger circuits and half the voices yourself, and no two boxes agree. Knockwire keeps what each jack really puts out and takes in, lets you lay out every song’s leads, checks each one at its worst before anything is plugged in, and prints a sheet that somebody who has never seen the rig can patch from.
        </p>
        <div className="flex flex-wrap gap-3">
          {user ? <ButtonLink tone="primary" href={paths.rigs()}>Go to your rigs</ButtonLink> : (
            <>
              <ButtonLink tone="primary" href={paths.signUp()}>Start a rig</ButtonLink>
              <ButtonLink href={paths.signIn()}>Sign in</ButtonLink>
            </>
          )}
        </div>
      </section>
      <section aria-labelledby="try" className="flex flex-col gap-4 bg-bench p-4 md:p-5">
        <h2 id="try" className="text-2xl font-bold">Try it: a 9 V trigger into a 5 V input</h2>
        <p className="max-w-prose text-ink-soft">The box runs on a battery, fresh or nearly flat; the chip behind the jack stands half a volt above its own supply. Change a figure and see what the lead would do.</p>
        <LiveExample first={first} />
      </section>
      <section aria-labelledby="does" className="grid gap-6 md:grid-cols-3">
        <h2 id="does" className="sr-only">What it does</h2>
        {[
          ["Gear, with its figures", "Write them as you read them: 4k7, 20k–50k, 0.01 µF. What nobody has measured yet stays marked, and you are told which one measurement settles most."],
          ["A board for every song", "Cards in four lanes, leads with numbers, and at every input the volts that arrive and one word for what they do there."],
          ["Paper for the night", "One sheet a song, drawn from the same board, legible at arm’s length from a cheap black and white printer."],
        ].map(([title, text]) => (
          <div key={title} className="flex flex-col gap-2">
            <h3 className="text-xl font-bold">{title}</h3>
            <p className="text-ink-soft">{text}</p>
          </div>
        ))}
      </section>
      <p className="text-sm text-ink-soft">The API is open to read: <Link className="underline" href={paths.api.openapi()} prefetch={false}>its OpenAPI description</Link>.</p>
    </div>
  );
}
