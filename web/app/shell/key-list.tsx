import { Dialog, Heading, Modal, ModalOverlay } from 'react-aria-components';
import { Button } from '../../components/ui/button';
import { Checkbox } from '../../components/ui/checkbox';
import { Kbd } from '../../components/ui/kbd';
import { keyName } from '../../components/ui/running-foot';
import { useRegisteredShortcuts, useSingleKeys } from '../../lib/shortcuts';
import { setKeyListOpen, useKeyListOpen } from './key-list-state';

/** Every key of the page, and the switch for single ones. It covers nothing that is being worked on for long. */
export function KeyList() {
  const isOpen = useKeyListOpen();
  const shortcuts = useRegisteredShortcuts();
  const [singleKeys, setSingleKeys] = useSingleKeys();
  return (
    <ModalOverlay className="key-overlay" isOpen={isOpen} onOpenChange={setKeyListOpen} isDismissable>
      <Modal className="popover">
        <Dialog className="key-panel">
          <Heading slot="title" className="text-row font-head">
            Keys of this page
          </Heading>
          <dl className="key-list">
            {shortcuts.map((shortcut) => (
              <div key={`${shortcut.key}${shortcut.label}`} className="contents">
                <dt>
                  <Kbd>{keyName(shortcut.key, shortcut.ctrl)}</Kbd>
                </dt>
                <dd>{shortcut.label}</dd>
              </div>
            ))}
          </dl>
          <Checkbox isSelected={singleKeys} onChange={setSingleKeys}>
            Single keys act when no field has the focus, in this browser
          </Checkbox>
          <div className="acts pt-2">
            <Button slot="close">Close</Button>
          </div>
        </Dialog>
      </Modal>
    </ModalOverlay>
  );
}
