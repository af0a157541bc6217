import NextAuth from "next-auth";
import { authOptions } from "@/lib/auth/options";

type Params = { params: Promise<{ nextauth: string[] }> };

const handle = (request: Request, context: Params) => NextAuth(authOptions())(request, context);

export { handle as GET, handle as POST };
