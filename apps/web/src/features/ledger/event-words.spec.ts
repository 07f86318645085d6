import { ACTIONS } from './action-words';
import { eventSentence } from './event-words';

const event = (given: Partial<Parameters<typeof eventSentence>[0]>) => ({
  actorName: 'Hanne Voss',
  action: 'revision.approved',
  subjectType: 'revision',
  subjectCode: 'R-0031',
  before: null,
  after: null,
  ...given,
});

describe('eventSentence()', () => {
  it.each([
    [event({ after: { state: 'approved', number: 3 } }), 'Hanne Voss approved R-0031 revision 3'],
    [event({ action: 'revision.drafted', after: { number: null } }), 'Hanne Voss drafted a revision of R-0031'],
    [event({ action: 'cell.differs', subjectType: 'cell', subjectCode: 'C-0117 B4' }), 'Hanne Voss marked with other values C-0117 B4'],
    [event({ action: 'hold.placed', subjectType: 'machine', subjectCode: null }), 'Hanne Voss placed a hold on a machine'],
    [
      event({ action: 'machine.changed', subjectType: 'machine', subjectCode: null, after: { name: 'Fibre 1' } }),
      'Hanne Voss changed the machine Fibre 1',
    ],
    [
      event({ action: 'invitation.sent', subjectType: 'invitation', subjectCode: null, after: { email: 'jo@tidewater.example' } }),
      'Hanne Voss invited jo@tidewater.example',
    ],
    [
      event({ action: 'member.removed', subjectType: 'member', subjectCode: null, before: { printedName: 'Jonah Pell' } }),
      'Hanne Voss removed Jonah Pell',
    ],
    [event({ action: 'shop.policy-signed', subjectType: 'shop', subjectCode: null }), 'Hanne Voss signed the rules of the shop'],
    [event({ action: 'widget.bent', subjectType: 'widget', subjectCode: null }), 'Hanne Voss widget bent'],
  ])('says it as people do', (given, sentence) => expect(eventSentence(given)).toBe(sentence));

  it('has another choice of words for each action', () => {
    const labels = Object.values(ACTIONS).map(({ label }) => label);
    expect(new Set(labels).size).toBe(labels.length);
  });
});
