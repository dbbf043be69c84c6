import { Authenticator } from "remix-auth";
import { FormStrategy } from "remix-auth-form";
import { z } from "zod";
import { findPersonByEmail, type Person, passwordMatches } from "~/models/person.server";
import { invalid } from "~/models/refusal";

const credentials = z.object({
  email: z.string().trim().min(3).max(254),
  password: z.string().min(1).max(512),
});

/** Who a sign-in form is from. @throws Refusal `invalid`, the same whether the address or the password is wrong */
export const authenticator = new Authenticator<Person>();

authenticator.use(
  new FormStrategy(async ({ form }) => {
    const typed = credentials.safeParse(Object.fromEntries(form));
    if (!typed.success) {
      throw invalid({
        path: "email",
        code: "incomplete",
        message: "Type your e-mail address and your password.",
      });
    }
    const { email, password } = typed.data;
    const matches = await passwordMatches(email, password);
    const person = matches ? await findPersonByEmail(email) : undefined;
    if (!person) {
      throw invalid({
        path: "email",
        code: "no-match",
        message: "This e-mail address and password do not belong together.",
      });
    }
    return person;
  }),
  "form",
);
