import { cleanup, fireEvent, render, screen, waitFor } from "@testing-library/react";
import { afterEach, describe, expect, it, vi } from "vitest";
import { z } from "zod";
import { ApiProblem, NetworkProblem } from "./api";
import { Button } from "./button";
import { RadioButtons } from "./choices";
import { Field } from "./field";
import { FormError } from "./form-error";
import { NumberInput } from "./number-input";
import { useProblemForm } from "./use-problem-form";

afterEach(cleanup);

const schema = z.object({
  value: z.string().min(1, "Type a number, for example 7.9."),
  pump: z.string().nullish(),
});

function Probe({ send }: { send: (values: z.output<typeof schema>, key: string) => Promise<void> }) {
  const { form, problem, submit, errorOf } = useProblemForm({ schema, defaultValues: { value: "" }, send });
  return (
    <form onSubmit={submit} noValidate>
      <FormError problem={problem} labels={{ value: "Oxygen" }} />
      <Field label="Oxygen" name="value" required error={errorOf("value")} hint="At the surface.">
        <NumberInput signed unit="mg/L" {...form.register("value")} />
      </Field>
      <Field label="Pump" name="pump" group error={errorOf("pump")}>
        <RadioButtons
          {...form.register("pump")}
          options={[
            { value: "on", label: "on" },
            { value: "off", label: "off" },
          ]}
        />
      </Field>
      <Button type="submit" variant="next">
        Store
      </Button>
    </form>
  );
}

const oxygen = () => screen.getByRole<HTMLInputElement>("textbox", { name: "Oxygen" });
const store = () => fireEvent.click(screen.getByRole("button", { name: "Store" }));
const refusal = (pointer: string, status = 422) =>
  new ApiProblem({
    type: "urn:x:problem:invalid",
    title: "Some of this cannot be used",
    status,
    detail: "One value cannot be used.",
    errors: [{ pointer, code: "x", detail: "81.2 is not possible here; did you mean 8.12?" }],
  });

describe("a form", () => {
  it("says under the field what its own check found, and sends nothing", async () => {
    const send = vi.fn(async () => undefined);
    render(<Probe send={send} />);
    store();
    await screen.findByText("Type a number, for example 7.9.");
    expect(send).not.toHaveBeenCalled();
    expect(oxygen().getAttribute("aria-invalid")).toBe("true");
    expect(oxygen().getAttribute("aria-describedby")).toBe("field-value-hint field-value-error");
  });

  it("puts a refusal of the server under the field it points at and loses nothing typed", async () => {
    render(<Probe send={() => Promise.reject(refusal("/value"))} />);
    fireEvent.change(oxygen(), { target: { value: "81.2" } });
    store();
    await waitFor(() =>
      expect(document.getElementById("field-value-error")?.textContent).toContain("did you mean 8.12?"),
    );
    expect(oxygen().value).toBe("81.2");
    const link = screen.getByRole("link", { name: /Oxygen: 81.2 is not possible/ });
    fireEvent.click(link);
    expect(document.activeElement).toBe(oxygen());
  });

  it("shows a refusal that points nowhere in the summary alone", async () => {
    render(<Probe send={() => Promise.reject(refusal(""))} />);
    fireEvent.change(oxygen(), { target: { value: "7" } });
    store();
    expect((await screen.findByRole("alert")).textContent).toContain("did you mean 8.12?");
    expect(document.getElementById("field-value-error")).toBeNull();
  });

  it("keeps its key while it is not known whether the server heard, and takes a new one after a refusal", async () => {
    const keys: string[] = [];
    const answers: (Error | null)[] = [new NetworkProblem(null), refusal("/value"), null];
    const send = async (_values: unknown, key: string) => {
      keys.push(key);
      const answer = answers.shift();
      if (answer) throw answer;
    };
    render(<Probe send={send} />);
    fireEvent.change(oxygen(), { target: { value: "7.9" } });
    for (let n = 1; n <= 3; n += 1) {
      store();
      await waitFor(() => expect(keys).toHaveLength(n));
      fireEvent.change(oxygen(), { target: { value: `7.${n}` } });
    }
    expect(keys[1]).toBe(keys[0]);
    expect(keys[2]).not.toBe(keys[1]);
  });

  it("changes the sign by the ± key and tells the form", async () => {
    const send = vi.fn(async (_values: z.output<typeof schema>, _key: string) => undefined);
    render(<Probe send={send} />);
    fireEvent.change(oxygen(), { target: { value: "1.5" } });
    fireEvent.click(screen.getByRole("button", { name: "Change sign" }));
    expect(oxygen().value).toBe("-1.5");
    fireEvent.click(screen.getByRole("radio", { name: "off" }));
    store();
    await waitFor(() => expect(send.mock.calls[0]?.[0]).toEqual({ value: "-1.5", pump: "off" }));
  });

  it("cannot be sent twice while it is being sent", () => {
    const press = vi.fn();
    render(
      <Button busy onClick={press} type="submit">
        Storing…
      </Button>,
    );
    fireEvent.click(screen.getByRole("button"));
    expect(press).not.toHaveBeenCalled();
    expect(screen.getByRole("button").getAttribute("type")).toBe("button");
  });
});
