import { Box } from '@chakra-ui/react/box';
import type { Part, RevisionDetail, VariantClearance } from '@windchest/contracts';
import { clearanceTexts } from '../../config/texts/clearance.js';
import { variantTexts as texts } from '../../config/texts/workshop-variants.js';
import { Text } from '../../ui/text.js';
import { MeasuredCell } from './measured-cell.js';
import { meshesToTake, variantFileName } from './part-meshes.js';
import { TakeMesh } from './take-mesh.js';
import { TakeVariantOut } from './take-variant-out.js';
import { ChooseFile } from './upload/choose-file.js';
import { isFailed, isUnderWay } from './upload/upload-item.js';
import { useUploads } from './upload/uploads.js';

const clearances: readonly VariantClearance[] = ['minus', 'plus'];

interface VariantProps {
  revision: RevisionDetail;
  part: Part;
  clearance: VariantClearance;
}

function Variant({ revision, part, clearance }: VariantProps) {
  const { items, queue } = useUploads(revision.id);
  const there = part.variants.find((one) => one.clearance === clearance);
  const named = clearanceTexts.named(clearance);
  const prefix = variantFileName(part, clearance, '');
  const sent = items.find(({ file }) => file.name.startsWith(prefix));
  const others = meshesToTake(part, revision.parts);
  const send = (file: File) =>
    queue.add(
      [new File([file], variantFileName(part, clearance, file.name), { type: file.type })],
      revision.limits,
    );
  return (
    <Box as="li" paddingBlock="3" borderBottomWidth="1px" borderColor="hairline" display="grid" gap="2">
      <Box
        display="flex"
        flexWrap="wrap"
        justifyContent="space-between"
        alignItems="baseline"
        columnGap="4"
        rowGap="2"
      >
        <Box fontWeight="semibold">{named}</Box>
        <Box display="flex" flexWrap="wrap" gap="2" alignItems="center">
          <ChooseFile
            label={there ? texts.replace : texts.send}
            of={texts.forClearance(named)}
            accept=".stl,.3mf"
            onFile={send}
          />
          {there && <TakeVariantOut revisionId={revision.id} part={part} clearance={clearance} />}
        </Box>
      </Box>
      {there && (
        <Box>
          <Box overflowWrap="anywhere">{there.file.fileName}</Box>
          <MeasuredCell file={there.file} />
        </Box>
      )}
      {sent && isUnderWay(sent) && (
        <Text look="small" isSoft aria-live="polite">
          {texts.sending(sent.file.name)}
        </Text>
      )}
      {sent && isFailed(sent) && 'sentence' in sent.state && (
        <Box role="alert" fontSize="sm" lineHeight="snug" color="stop">
          {sent.state.sentence}
        </Box>
      )}
      {!there && others.length > 0 && (
        <TakeMesh revisionId={revision.id} part={part} clearance={clearance} others={others} />
      )}
    </Box>
  );
}

/** The clearances a part comes in besides its own file. Each is kept as soon as it is there. */
export const PartVariants = ({ revision, part }: Omit<VariantProps, 'clearance'>) => (
  <Box as="section" aria-label={texts.heading} marginTop="5">
    <Box fontSize="sm" fontWeight="semibold">
      {texts.heading}
    </Box>
    <Text look="small" isSoft marginBottom="2" maxWidth="measure">
      {texts.hint}
    </Text>
    <Box as="ul" listStyle="none" borderTopWidth="1px" borderColor="hairline">
      {clearances.map((clearance) => (
        <Variant key={clearance} revision={revision} part={part} clearance={clearance} />
      ))}
    </Box>
  </Box>
);
