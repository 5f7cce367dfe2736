import { Refusal } from "@/app/_shell/refusal";

export default function RecordNotFound() {
  return (
    <Refusal title="There is no such record">
      <p>
        The address names something that is not here, or that you may not see. Nothing is ever deleted: it may
        stand under another code, or in an area that is not yours.
      </p>
    </Refusal>
  );
}
