// One module for all pages of the Desk, fetched by the first of them: what they share weighs on no other page.
export { DeskLayout } from './desk-layout';
export { DeskScreen } from './desk-screen';
export { SubmissionScreen } from './submission-screen';
