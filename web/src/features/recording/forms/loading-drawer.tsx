import { Drawer } from '../../../ui/drawer';
import { SkeletonRows } from '../../../ui/skeleton';

interface LoadingDrawerProps {
  title: string;
  onClose: () => void;
}

/** While the drawer's own code or its draft is on the way. */
export const LoadingDrawer = ({ title, onClose }: LoadingDrawerProps) => (
  <Drawer title={title} onClose={onClose}>
    <SkeletonRows label="Opening the form" rows={8} bars={[24, 18, 18, 24]} />
  </Drawer>
);
