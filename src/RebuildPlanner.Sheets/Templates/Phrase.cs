namespace RebuildPlanner.Sheets.Templates;

/// <summary>The phrases of the sheets; templates/sheet-wording.json holds their words under the same names.</summary>
#pragma warning disable CS1591 // The words in the file say what each phrase is.
public enum Phrase
{
    Title, Subject, Foot, PageOf, Customer, Contact, Job, JobTitle, Opened, Engine, EngineUnnamed, EngineOfOne, Complaint, Asked,
    Stage, Issued, FuelRecorded, AnswerLead, AnswerSame, AnswerRange, AnswerNone, AnswerWithout, AnswerDisplacement, AnswerHeld,
    AnswerOutside, AnswerOpen, AnswerNoLimits, AnswerMeaning, MissingHead, MissingLead, CylindersHead, CylindersLead, MethodFirstOrder, MethodTrials, MethodFigure, MethodSpread, MethodUnsure, DigitOne, DigitTwo, Cylinder,
    Ratio, From95, WorstFrom, To, Bore, Swept, Clearance, PistonToHead, Taper, OutOfRound, Trapped, Cranking, Doubt, Share,
    CrankingNote, LimitsHead, LimitsNone, LimitName, LimitOfCylinder, LimitOfPart, LimitWithin, LimitOutside, LimitOpen, LimitMissing,
    LimitSettle, LimitNoSettle, LimitSettleCylinders, LimitsTable, All, TrialsHead, TrialsCaption, TrialsOfCylinder, VolumesHead, VolumesCaption, VolumesMissing, VolumesTotal, Chamber, Gasket, Deck, Crown,
    TopLand, CrossCheck, SectionHead, SectionCaption, SectionScale, SectionDetail, SectionStroke, SectionRod, SectionBore,
    SectionGap, SectionDeck, SectionGasket, SectionOpening, SectionTopLand, SectionHeadPart, SectionBlockPart, SectionPistonPart,
    SectionNoRod, SectionNoHeight, SpreadHead, SpreadName, SpreadValue, Displacement, SpreadRatio, SpreadChamber, SpreadNone,
    WorkHead, WorkPart, WorkPlace, WorkValue, WorkStage, FittedPiston, FittedGasket, PieceOf, FinishedToPiston, Check,
    CheckResult, Notes, OriginsHead, OriginsLead, OriginKind, OriginFigure, OriginCylinders, OriginValue, OriginFrom, OriginRange,
    CautionsHead, SignHead, SignMeasured, SignMachined, SignChecked, SignCustomer, Attached, FormTitle, FormLead, FormFoot,
    FormGaugesHead, FormGauge, FormKind, FormResolution, FormLimit, FormSetWith, FormCalibrated, FormRatioHead, FormFitsHead,
    FormPlace, FormGaugeColumn, FormTemperature, FormStart, FormEnd, FormRefillStart, FormRefillEnd, FormDrop, FormBlank, FormRemarks, FormBy, FormEngine, FormHeadOf, FormBankOf, FormTorquePlate,
    FormDeckWords, FormCrownWords, FormProtrusionWords,
}
#pragma warning restore CS1591
