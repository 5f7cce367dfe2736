import type { Metadata } from "next";
import { PlainFrame } from "./_shell/plain-frame";
import { Refusal } from "./_shell/refusal";

export const metadata: Metadata = { title: "No such page" };

export default function PageNotFound() {
  return (
    <PlainFrame>
      <Refusal title="There is no such page">
        <p>Check the address, or begin at the start.</p>
      </Refusal>
    </PlainFrame>
  );
}
