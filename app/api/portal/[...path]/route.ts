import { noSuchPath } from "@/lib/http/otherMethods";

export { noSuchPath as GET, noSuchPath as POST, noSuchPath as PUT, noSuchPath as PATCH, noSuchPath as DELETE };
