import { Refusal } from "@/app/_shell/refusal";

export default function Forbidden() {
  return (
    <Refusal title="Your role does not allow this page">
      <p>
        You are signed in, but none of your roles opens this page. If your work needs it, ask an administrator
        to give you the role.
      </p>
    </Refusal>
  );
}
