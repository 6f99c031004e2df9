import { Workbench } from '../features/optics/workbench';

export default function OpticsNew() {
  return <Workbench set={null} />;
}
