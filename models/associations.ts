import { ApiToken } from './api-token';
import { Arm } from './arm';
import { AuditEvent } from './audit-event';
import { DexterityMap } from './dexterity-map';
import { FloorPlan } from './floor-plan';
import { Invitation } from './invitation';
import { Layout } from './layout';
import { LayoutItem } from './layout-item';
import { MapTile } from './map-tile';
import { Membership } from './membership';
import { Organisation } from './organisation';
import { PasswordReset } from './password-reset';
import { Presence } from './presence';
import { Project } from './project';
import { ProjectViewer } from './project-viewer';
import { Remark } from './remark';
import { RemarkReply } from './remark-reply';
import { Report } from './report';
import { Revision } from './revision';
import { ShareLink } from './share-link';
import { Comparison } from './comparison';
import { RemarkMention } from './remark-mention';
import { RemarkPicture } from './remark-picture';
import { RemarkRead } from './remark-read';
import { ShareOpen } from './share-open';
import { SignOff } from './sign-off';
import { User } from './user';

/** Every association, named in one place; the foreign keys themselves are made by the migrations. */
export function associate(): void {
  Membership.belongsTo(Organisation, { as: 'organisation', foreignKey: 'organisationId' });
  Membership.belongsTo(User, { as: 'user', foreignKey: 'userId' });
  Membership.hasMany(ProjectViewer, { as: 'projectViewers', foreignKey: 'membershipId' });
  User.hasOne(Membership, { as: 'membership', foreignKey: 'userId' });
  Organisation.hasMany(Membership, { as: 'memberships', foreignKey: 'organisationId' });

  Presence.belongsTo(User, { as: 'user', foreignKey: 'userId' });

  Project.belongsTo(Organisation, { as: 'organisation', foreignKey: 'organisationId' });
  Project.hasMany(Layout, { as: 'layouts', foreignKey: 'projectId' });
  Project.hasMany(FloorPlan, { as: 'floorPlans', foreignKey: 'projectId' });
  Project.hasMany(ProjectViewer, { as: 'viewers', foreignKey: 'projectId' });
  ProjectViewer.belongsTo(Project, { as: 'project', foreignKey: 'projectId' });
  ProjectViewer.belongsTo(Membership, { as: 'membership', foreignKey: 'membershipId' });

  FloorPlan.belongsTo(Project, { as: 'project', foreignKey: 'projectId' });
  Arm.belongsTo(Organisation, { as: 'organisation', foreignKey: 'organisationId' });

  Layout.belongsTo(Project, { as: 'project', foreignKey: 'projectId' });
  Layout.belongsTo(FloorPlan, { as: 'floorPlan', foreignKey: 'floorPlanId' });
  Layout.hasMany(LayoutItem, { as: 'items', foreignKey: 'layoutId' });
  Layout.hasMany(Revision, { as: 'revisions', foreignKey: 'layoutId' });
  LayoutItem.belongsTo(Layout, { as: 'layout', foreignKey: 'layoutId' });

  Revision.belongsTo(Layout, { as: 'layout', foreignKey: 'layoutId' });
  Revision.belongsTo(User, { as: 'issuer', foreignKey: 'issuedBy' });
  Revision.hasMany(ShareLink, { as: 'shareLinks', foreignKey: 'revisionId' });
  Revision.hasMany(Remark, { as: 'remarks', foreignKey: 'revisionId' });
  ShareLink.belongsTo(Revision, { as: 'revision', foreignKey: 'revisionId' });

  Remark.belongsTo(Revision, { as: 'revision', foreignKey: 'revisionId' });
  Remark.belongsTo(User, { as: 'user', foreignKey: 'userId' });
  Remark.hasMany(RemarkReply, { as: 'replies', foreignKey: 'remarkId' });
  RemarkReply.belongsTo(Remark, { as: 'remark', foreignKey: 'remarkId' });
  RemarkReply.belongsTo(User, { as: 'user', foreignKey: 'userId' });
  Remark.belongsTo(User, { as: 'assignee', foreignKey: 'assigneeId' });
  Remark.hasMany(RemarkMention, { as: 'mentions', foreignKey: 'remarkId' });
  Remark.hasMany(RemarkPicture, { as: 'pictures', foreignKey: 'remarkId' });
  Remark.hasMany(RemarkRead, { as: 'reads', foreignKey: 'remarkId' });
  RemarkMention.belongsTo(User, { as: 'user', foreignKey: 'userId' });

  Revision.hasMany(SignOff, { as: 'signOffs', foreignKey: 'revisionId' });
  SignOff.belongsTo(Revision, { as: 'revision', foreignKey: 'revisionId' });
  ShareLink.hasMany(ShareOpen, { as: 'opens', foreignKey: 'shareLinkId' });
  Comparison.belongsTo(Project, { as: 'project', foreignKey: 'projectId' });
  Comparison.belongsTo(User, { as: 'author', foreignKey: 'createdBy' });

  DexterityMap.hasMany(MapTile, { as: 'tiles', foreignKey: 'mapId' });

  Invitation.belongsTo(Organisation, { as: 'organisation', foreignKey: 'organisationId' });
  Invitation.belongsTo(User, { as: 'inviter', foreignKey: 'invitedBy' });
  PasswordReset.belongsTo(User, { as: 'user', foreignKey: 'userId' });

  ApiToken.belongsTo(Membership, { as: 'membership', foreignKey: 'membershipId' });
  AuditEvent.belongsTo(User, { as: 'user', foreignKey: 'userId' });
  AuditEvent.belongsTo(ShareLink, { as: 'shareLink', foreignKey: 'shareLinkId' });
  Report.belongsTo(Layout, { as: 'layout', foreignKey: 'layoutId' });
  Report.belongsTo(User, { as: 'asker', foreignKey: 'askedBy' });
}
