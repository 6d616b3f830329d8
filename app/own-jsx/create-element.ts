/** What an element with a key after spread properties is compiled to: the fields of forms, which stay in what was typed. */
export { createElement } from "react";
