package org.wispwright.ui.shot;

/** Something handed to us is not as it must be. The message is the one sentence that a person reads. */
public final class ShotException extends RuntimeException {
    private final transient Finding finding;

    /** Carries one finding. */
    public ShotException(Finding finding) {
        super(finding.inWords());
        this.finding = finding;
    }

    /** Carries one finding and what led to it, which only {@code --verbose} shows. */
    public ShotException(Finding finding, Throwable cause) {
        super(finding.inWords(), cause);
        this.finding = finding;
    }

    /** What is wrong and where. */
    public Finding finding() {
        return finding;
    }
}
