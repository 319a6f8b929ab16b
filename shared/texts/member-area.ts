import { accountTexts } from './account.en'
import { adminTexts } from './admin.en'
import { deedsTexts } from './deeds.en'
import { deploymentTexts } from './deployment.en'
import { depotsTexts } from './depots.en'
import { deskTexts } from './desk.en'
import { eventTexts } from './event.en'
import { forecastTexts } from './forecast.en'
import { layoutTexts } from './layout.en'
import { lineTexts } from './line.en'
import { linePlanTexts } from './line-plan.en'
import { orderCardTexts } from './order-card.en'
import { projectTexts } from './project.en'
import { scenarioTexts } from './scenario.en'
import { sheetTexts } from './sheet.en'
import { sheetPageTexts } from './sheet-page.en'
import { statesTexts } from './states.en'
import { surveyImportTexts } from './survey-import.en'

/** Texts of everything behind the sign-in; they are loaded when the area is entered. */
export const areaTexts = {
  en: {
    account: accountTexts,
    admin: adminTexts,
    deeds: deedsTexts,
    deployment: deploymentTexts,
    depotsPage: depotsTexts,
    desk: deskTexts,
    eventPage: eventTexts,
    forecast: forecastTexts,
    layout: layoutTexts,
    linePage: lineTexts,
    linePlan: linePlanTexts,
    orderCard: orderCardTexts,
    projectPage: projectTexts,
    scenarioPage: scenarioTexts,
    sheet: sheetTexts,
    sheetPage: sheetPageTexts,
    states: statesTexts,
    surveyImport: surveyImportTexts,
  },
} as const
