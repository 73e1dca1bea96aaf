import type { LayoutHandle } from './fieldHandle';
import { Menu, MenuItem } from './Menu';

/** Lists, emphasis, links and tables, with the keys that do the same. `onText` shows the words as they are stored. */
export function LayoutMenu({ field, onText }: { field: LayoutHandle; onText: () => void }) {
  return (
    <Menu label="Layout" quiet>
      {(close) => (
        <>
          {field.formats().map((format) => (
            <MenuItem
              key={format.name}
              detail={format.keys ?? ''}
              onChoose={() => {
                close();
                field.run(format);
              }}
            >
              {format.name}
            </MenuItem>
          ))}
          <MenuItem
            onChoose={() => {
              close();
              onText();
            }}
          >
            Show it as it is stored
          </MenuItem>
        </>
      )}
    </Menu>
  );
}
