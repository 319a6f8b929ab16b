import { computed } from 'vue'
import { useRoute, useRouter } from 'vue-router'
import type { Course } from '@shared/demonstrator/course'

/** Course and scene as the address carries them; what is not there becomes the first. */
export function useCourseAddress(courses: readonly Course[]) {
  const route = useRoute()
  const router = useRouter()
  const first = courses[0]!

  const course = computed(() => courses.find(({ id }) => id === route.query.course) ?? first)

  const number = computed({
    get: () => {
      const wanted = Math.floor(Number(route.query.scene))
      const count = course.value.scenes.length
      return wanted >= 1 && wanted <= count ? wanted : 1
    },
    set: (scene) => write(course.value.id, scene),
  })

  function write(id: string, scene: number): void {
    void router.replace({ query: { ...route.query, course: id, scene: String(scene) } })
  }

  return { course, number, choose: (id: string) => write(id, 1) }
}
