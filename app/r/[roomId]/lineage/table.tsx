import { TableScreen } from '@/features/lineage/TableScreen';

export default function PedigreeTable() {
  return <TableScreen />;
}
