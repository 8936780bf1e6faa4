import * as account from '@/app/api/account/route';
import * as accountMails from '@/app/api/account/mails/route';
import * as accountPasswordReset from '@/app/api/account/password-reset/route';
import * as accountPasswordResetToken from '@/app/api/account/password-reset/[token]/route';
import * as arms from '@/app/api/arms/route';
import * as armsArmId from '@/app/api/arms/[armId]/route';
import * as armsArmIdVersions from '@/app/api/arms/[armId]/versions/route';
import * as audit from '@/app/api/audit/route';
import * as auditCsv from '@/app/api/audit/csv/route';
import * as comparisonsComparisonId from '@/app/api/comparisons/[comparisonId]/route';
import * as exportsSubjectSubjectIdFile from '@/app/api/exports/[subject]/[subjectId]/[file]/route';
import * as exportsSchema from '@/app/api/exports/schema/route';
import * as fixtures from '@/app/api/fixtures/route';
import * as fixturesFixtureId from '@/app/api/fixtures/[fixtureId]/route';
import * as floorPlansFloorPlanId from '@/app/api/floor-plans/[floorPlanId]/route';
import * as floorPlansFloorPlanIdPicture from '@/app/api/floor-plans/[floorPlanId]/picture/route';
import * as invitations from '@/app/api/invitations/route';
import * as invitationsInvitationId from '@/app/api/invitations/[invitationId]/route';
import * as invitationsAcceptToken from '@/app/api/invitations/accept/[token]/route';
import * as layoutsLayoutId from '@/app/api/layouts/[layoutId]/route';
import * as layoutsLayoutIdChanges from '@/app/api/layouts/[layoutId]/changes/route';
import * as layoutsLayoutIdCycle from '@/app/api/layouts/[layoutId]/cycle/route';
import * as layoutsLayoutIdOperations from '@/app/api/layouts/[layoutId]/operations/route';
import * as layoutsLayoutIdPresence from '@/app/api/layouts/[layoutId]/presence/route';
import * as layoutsLayoutIdRemarks from '@/app/api/layouts/[layoutId]/remarks/route';
import * as layoutsLayoutIdRevisions from '@/app/api/layouts/[layoutId]/revisions/route';
import * as layoutsLayoutIdThumbnail from '@/app/api/layouts/[layoutId]/thumbnail/route';
import * as layoutsLayoutIdVerdicts from '@/app/api/layouts/[layoutId]/verdicts/route';
import * as maps from '@/app/api/maps/route';
import * as mapsMapId from '@/app/api/maps/[mapId]/route';
import * as mapsMapIdCancel from '@/app/api/maps/[mapId]/cancel/route';
import * as mapsMapIdRetry from '@/app/api/maps/[mapId]/retry/route';
import * as mapsMapIdTiles from '@/app/api/maps/[mapId]/tiles/route';
import * as members from '@/app/api/members/route';
import * as membersMemberId from '@/app/api/members/[memberId]/route';
import * as projects from '@/app/api/projects/route';
import * as projectsProjectId from '@/app/api/projects/[projectId]/route';
import * as projectsProjectIdComparisons from '@/app/api/projects/[projectId]/comparisons/route';
import * as projectsProjectIdFloorPlans from '@/app/api/projects/[projectId]/floor-plans/route';
import * as projectsProjectIdImport from '@/app/api/projects/[projectId]/import/route';
import * as projectsProjectIdLayouts from '@/app/api/projects/[projectId]/layouts/route';
import * as projectsProjectIdPeople from '@/app/api/projects/[projectId]/people/route';
import * as projectsProjectIdRemarks from '@/app/api/projects/[projectId]/remarks/route';
import * as remarksRemarkId from '@/app/api/remarks/[remarkId]/route';
import * as remarksRemarkIdPictures from '@/app/api/remarks/[remarkId]/pictures/route';
import * as remarksRemarkIdPicturesPictureId from '@/app/api/remarks/[remarkId]/pictures/[pictureId]/route';
import * as remarksRemarkIdRead from '@/app/api/remarks/[remarkId]/read/route';
import * as remarksRemarkIdReplies from '@/app/api/remarks/[remarkId]/replies/route';
import * as reports from '@/app/api/reports/route';
import * as reportsReportId from '@/app/api/reports/[reportId]/route';
import * as reportsReportIdFile from '@/app/api/reports/[reportId]/file/route';
import * as reportsReportIdRetry from '@/app/api/reports/[reportId]/retry/route';
import * as revisionsRevisionId from '@/app/api/revisions/[revisionId]/route';
import * as revisionsRevisionIdCycle from '@/app/api/revisions/[revisionId]/cycle/route';
import * as revisionsRevisionIdRemarks from '@/app/api/revisions/[revisionId]/remarks/route';
import * as revisionsRevisionIdRestore from '@/app/api/revisions/[revisionId]/restore/route';
import * as revisionsRevisionIdShareLinks from '@/app/api/revisions/[revisionId]/share-links/route';
import * as revisionsRevisionIdSignOffs from '@/app/api/revisions/[revisionId]/sign-offs/route';
import * as revisionsRevisionIdVerdicts from '@/app/api/revisions/[revisionId]/verdicts/route';
import * as shareLinksShareLinkId from '@/app/api/share-links/[shareLinkId]/route';
import * as shareToken from '@/app/api/share/[token]/route';
import * as shareTokenMapsMapId from '@/app/api/share/[token]/maps/[mapId]/route';
import * as shareTokenMapsMapIdTiles from '@/app/api/share/[token]/maps/[mapId]/tiles/route';
import * as shareTokenPicture from '@/app/api/share/[token]/picture/route';
import * as shareTokenRemarks from '@/app/api/share/[token]/remarks/route';
import * as shareTokenRemarksRemarkIdPictures from '@/app/api/share/[token]/remarks/[remarkId]/pictures/route';
import * as shareTokenRemarksRemarkIdPicturesPictureId from '@/app/api/share/[token]/remarks/[remarkId]/pictures/[pictureId]/route';
import * as shareTokenRemarksRemarkIdReplies from '@/app/api/share/[token]/remarks/[remarkId]/replies/route';
import * as shareTokenSignOffs from '@/app/api/share/[token]/sign-offs/route';
import * as studies from '@/app/api/studies/route';
import * as studiesStudyId from '@/app/api/studies/[studyId]/route';
import * as studiesStudyIdCancel from '@/app/api/studies/[studyId]/cancel/route';
import * as studiesStudyIdRetry from '@/app/api/studies/[studyId]/retry/route';
import * as tokens from '@/app/api/tokens/route';
import * as tokensTokenId from '@/app/api/tokens/[tokenId]/route';
import * as unsubscribeToken from '@/app/api/unsubscribe/[token]/route';

/** Every route of the API by its folder; a test demands that none is missing. */
export const ROUTES = {
  account: account,
  'account/mails': accountMails,
  'account/password-reset': accountPasswordReset,
  'account/password-reset/[token]': accountPasswordResetToken,
  arms: arms,
  'arms/[armId]': armsArmId,
  'arms/[armId]/versions': armsArmIdVersions,
  audit: audit,
  'audit/csv': auditCsv,
  'comparisons/[comparisonId]': comparisonsComparisonId,
  'exports/[subject]/[subjectId]/[file]': exportsSubjectSubjectIdFile,
  'exports/schema': exportsSchema,
  fixtures: fixtures,
  'fixtures/[fixtureId]': fixturesFixtureId,
  'floor-plans/[floorPlanId]': floorPlansFloorPlanId,
  'floor-plans/[floorPlanId]/picture': floorPlansFloorPlanIdPicture,
  invitations: invitations,
  'invitations/[invitationId]': invitationsInvitationId,
  'invitations/accept/[token]': invitationsAcceptToken,
  'layouts/[layoutId]': layoutsLayoutId,
  'layouts/[layoutId]/changes': layoutsLayoutIdChanges,
  'layouts/[layoutId]/cycle': layoutsLayoutIdCycle,
  'layouts/[layoutId]/operations': layoutsLayoutIdOperations,
  'layouts/[layoutId]/presence': layoutsLayoutIdPresence,
  'layouts/[layoutId]/remarks': layoutsLayoutIdRemarks,
  'layouts/[layoutId]/revisions': layoutsLayoutIdRevisions,
  'layouts/[layoutId]/thumbnail': layoutsLayoutIdThumbnail,
  'layouts/[layoutId]/verdicts': layoutsLayoutIdVerdicts,
  maps: maps,
  'maps/[mapId]': mapsMapId,
  'maps/[mapId]/cancel': mapsMapIdCancel,
  'maps/[mapId]/retry': mapsMapIdRetry,
  'maps/[mapId]/tiles': mapsMapIdTiles,
  members: members,
  'members/[memberId]': membersMemberId,
  projects: projects,
  'projects/[projectId]': projectsProjectId,
  'projects/[projectId]/comparisons': projectsProjectIdComparisons,
  'projects/[projectId]/floor-plans': projectsProjectIdFloorPlans,
  'projects/[projectId]/import': projectsProjectIdImport,
  'projects/[projectId]/layouts': projectsProjectIdLayouts,
  'projects/[projectId]/people': projectsProjectIdPeople,
  'projects/[projectId]/remarks': projectsProjectIdRemarks,
  'remarks/[remarkId]': remarksRemarkId,
  'remarks/[remarkId]/pictures': remarksRemarkIdPictures,
  'remarks/[remarkId]/pictures/[pictureId]': remarksRemarkIdPicturesPictureId,
  'remarks/[remarkId]/read': remarksRemarkIdRead,
  'remarks/[remarkId]/replies': remarksRemarkIdReplies,
  reports: reports,
  'reports/[reportId]': reportsReportId,
  'reports/[reportId]/file': reportsReportIdFile,
  'reports/[reportId]/retry': reportsReportIdRetry,
  'revisions/[revisionId]': revisionsRevisionId,
  'revisions/[revisionId]/cycle': revisionsRevisionIdCycle,
  'revisions/[revisionId]/remarks': revisionsRevisionIdRemarks,
  'revisions/[revisionId]/restore': revisionsRevisionIdRestore,
  'revisions/[revisionId]/share-links': revisionsRevisionIdShareLinks,
  'revisions/[revisionId]/sign-offs': revisionsRevisionIdSignOffs,
  'revisions/[revisionId]/verdicts': revisionsRevisionIdVerdicts,
  'share-links/[shareLinkId]': shareLinksShareLinkId,
  'share/[token]': shareToken,
  'share/[token]/maps/[mapId]': shareTokenMapsMapId,
  'share/[token]/maps/[mapId]/tiles': shareTokenMapsMapIdTiles,
  'share/[token]/picture': shareTokenPicture,
  'share/[token]/remarks': shareTokenRemarks,
  'share/[token]/remarks/[remarkId]/pictures': shareTokenRemarksRemarkIdPictures,
  'share/[token]/remarks/[remarkId]/pictures/[pictureId]': shareTokenRemarksRemarkIdPicturesPictureId,
  'share/[token]/remarks/[remarkId]/replies': shareTokenRemarksRemarkIdReplies,
  'share/[token]/sign-offs': shareTokenSignOffs,
  studies: studies,
  'studies/[studyId]': studiesStudyId,
  'studies/[studyId]/cancel': studiesStudyIdCancel,
  'studies/[studyId]/retry': studiesStudyIdRetry,
  tokens: tokens,
  'tokens/[tokenId]': tokensTokenId,
  'unsubscribe/[token]': unsubscribeToken,
} as const;
