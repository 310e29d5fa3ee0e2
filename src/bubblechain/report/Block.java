package bubblechain.report;

/** One part of a report, in the order in which it is shown. */
public sealed interface Block permits Facts, Table, Note {}
