export { emailOfToken, mailChoiceOf, setMailChoice, unsubscribeToken } from './choices';
export { deliverMail } from './deliver-mail';
export { sendMailLater } from './send-mail-later';
export type { TemplateData, TemplateName } from './templates';
