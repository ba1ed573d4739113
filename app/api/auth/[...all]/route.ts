import { getAuth } from "@/lib/auth/auth";
import { handleAuth } from "@/lib/http/handle-auth";

const handler = (request: Request) => handleAuth(request, getAuth().handler);

export { handler as GET, handler as POST };
