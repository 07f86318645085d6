import { chakra } from '@chakra-ui/react';
import { Dialog } from '../../components/dialog';
import { Keycap } from '../../components/keycap';
import { Switch } from '../../components/switch';
import { TextLink } from '../../components/text-link';
import { paths } from '../../lib/paths';
import { useShortcutList, useSingleKeySetting } from '../../lib/shortcuts';

/** All keys of the page, under `?`. */
export function KeyList({ onClose }: { onClose: () => void }) {
  const shortcuts = useShortcutList();
  const [areSingleKeysOn, setAreSingleKeysOn] = useSingleKeySetting();
  return (
    <Dialog title="Keys" onClose={onClose}>
      <chakra.dl display="grid" gridTemplateColumns="auto 1fr" columnGap="5" rowGap="2" alignItems="baseline">
        {shortcuts.map(({ keys, meaning }) => (
          <chakra.div key={`${keys} ${meaning}`} display="contents">
            <dt>
              <Keycap>{keyWords(keys)}</Keycap>
            </dt>
            <dd>{meaning}</dd>
          </chakra.div>
        ))}
      </chakra.dl>
      <chakra.div mt="5" pt="4" borderTop="hairline">
        <Switch
          label="Single-key shortcuts"
          isOn={areSingleKeysOn}
          onChange={setAreSingleKeysOn}
          help="Off leaves only those with Ctrl or ⌘."
        />
        <chakra.p mt="4">
          <TextLink to={paths.scienceIndex} onClick={onClose}>
            How the numbers are worked out
          </TextLink>
        </chakra.p>
      </chakra.div>
    </Dialog>
  );
}

function keyWords(keys: string): string {
  return keys.startsWith('mod+') ? `Ctrl or ⌘ ${keys.slice(4).toUpperCase()}` : keys;
}
