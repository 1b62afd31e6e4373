export { changedFields, recordAll, recordAudit, type AuditFact } from './record-audit';
