import { LoadingSteps } from '@/components/ui/mark'

export default function Loading() {
  return <LoadingSteps />
}
