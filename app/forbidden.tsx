import { PlainFrame } from "./_shell/plain-frame";
import { Refusal } from "./_shell/refusal";

export default function Forbidden() {
  return (
    <PlainFrame>
      <Refusal title="This is not allowed">
        <p>None of your roles opens this address.</p>
      </Refusal>
    </PlainFrame>
  );
}
