import { z } from "zod";

// The content policy forbids making code from text. Zod would try it for speed and be reported for it;
// imported before any schema is made.
z.config({ jitless: true });
