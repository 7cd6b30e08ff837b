-- Rules that hold whoever writes: what is stored for good does not change, the order of a review, four eyes, one result per run, and
-- a history whose head and last entry agree. The search path ends with pg_temp, so that a temporary table can't stand in for a real one. PP001 is four eyes, PP002 a wrong order, PP003 a change of what must not change.

CREATE FUNCTION forbid_change() RETURNS trigger LANGUAGE plpgsql SET search_path = public, pg_temp AS $$
BEGIN
    RAISE EXCEPTION 'Rows of % are never changed or removed.', TG_TABLE_NAME USING ERRCODE = 'PP003';
END $$;

DO $$
DECLARE
    name text;
BEGIN
    FOREACH name IN ARRAY ARRAY['history', 'revisions', 'controller_files', 'arm_model_versions', 'cell_setups', 'criteria_sheet_versions',
        'run_requests', 'review_transitions', 'decisions']
    LOOP
        EXECUTE format('CREATE TRIGGER keep_rows BEFORE UPDATE OR DELETE ON %I FOR EACH ROW EXECUTE FUNCTION forbid_change()', name);
        EXECUTE format('CREATE TRIGGER keep_table BEFORE TRUNCATE ON %I FOR EACH STATEMENT EXECUTE FUNCTION forbid_change()', name);
    END LOOP;
END $$;

CREATE TRIGGER keep_row BEFORE DELETE ON history_head FOR EACH ROW EXECUTE FUNCTION forbid_change();
CREATE TRIGGER keep_table BEFORE TRUNCATE ON history_head FOR EACH STATEMENT EXECUTE FUNCTION forbid_change();
CREATE TRIGGER keep_result BEFORE UPDATE OR DELETE ON runs FOR EACH ROW WHEN (OLD.state = 'Done') EXECUTE FUNCTION forbid_change();

INSERT INTO history_head (id, sequence, hash) VALUES (1, 0, decode(repeat('00', 32), 'hex'));

CREATE FUNCTION check_history_end() RETURNS trigger LANGUAGE plpgsql SET search_path = public, pg_temp AS $$
DECLARE
    head history_head;
BEGIN
    SELECT * INTO head FROM history_head WHERE id = 1;
    IF NOT EXISTS (SELECT FROM history WHERE sequence = head.sequence AND hash = head.hash)
        OR EXISTS (SELECT FROM history WHERE sequence > head.sequence) THEN
        RAISE EXCEPTION 'The head of the history must be its last entry.' USING ERRCODE = 'PP002';
    END IF;
    RETURN NULL;
END $$;

CREATE CONSTRAINT TRIGGER check_end AFTER INSERT ON history
    DEFERRABLE INITIALLY DEFERRED FOR EACH ROW EXECUTE FUNCTION check_history_end();
CREATE CONSTRAINT TRIGGER check_end AFTER UPDATE ON history_head
    DEFERRABLE INITIALLY DEFERRED FOR EACH ROW EXECUTE FUNCTION check_history_end();

CREATE FUNCTION review_may_move(old_state text, new_state text) RETURNS boolean LANGUAGE sql IMMUTABLE AS $$
    SELECT (old_state, new_state) IN (
        ('Draft', 'InReview'), ('Draft', 'Withdrawn'), ('Draft', 'Superseded'),
        ('InReview', 'Approved'), ('InReview', 'Rejected'), ('InReview', 'Withdrawn'), ('InReview', 'Superseded'),
        ('Approved', 'Proved'), ('Approved', 'Withdrawn'), ('Approved', 'Superseded'), ('Approved', 'Suspended'),
        ('Proved', 'Released'), ('Proved', 'Withdrawn'), ('Proved', 'Superseded'), ('Proved', 'Suspended'),
        ('Released', 'Withdrawn'), ('Released', 'Superseded'), ('Released', 'Suspended'),
        ('Rejected', 'InReview'), ('Rejected', 'Superseded'),
        ('Withdrawn', 'InReview'),
        ('Suspended', 'InReview'), ('Suspended', 'Withdrawn'), ('Suspended', 'Superseded'))
$$;

CREATE FUNCTION check_review_move() RETURNS trigger LANGUAGE plpgsql SET search_path = public, pg_temp AS $$
BEGIN
    IF TG_OP = 'INSERT' THEN
        IF NOT (NEW.state = 'Draft' AND NEW.round = 0 OR NEW.state = 'InReview' AND NEW.round = 1) OR NEW.approvals_given <> 0 THEN
            RAISE EXCEPTION 'A review begins as a draft.' USING ERRCODE = 'PP002';
        END IF;
        RETURN NEW;
    END IF;
    IF (NEW.plant_id, NEW.revision_id, NEW.assignment_id) <> (OLD.plant_id, OLD.revision_id, OLD.assignment_id) THEN
        RAISE EXCEPTION 'A review stays with its revision and assignment.' USING ERRCODE = 'PP003';
    END IF;
    IF NEW.state <> OLD.state AND NOT review_may_move(OLD.state, NEW.state) THEN
        RAISE EXCEPTION 'A review that is % can not become %.', OLD.state, NEW.state USING ERRCODE = 'PP002';
    END IF;
    -- A new round begins with a submission and with nothing else.
    IF NEW.round <> OLD.round + (CASE WHEN NEW.state = 'InReview' AND OLD.state <> 'InReview' THEN 1 ELSE 0 END)
        OR NEW.round = OLD.round AND (NEW.submitted_by, NEW.approvals_required) IS DISTINCT FROM (OLD.submitted_by, OLD.approvals_required) THEN
        RAISE EXCEPTION 'Who submitted a review, and its rule, change only with a new round.' USING ERRCODE = 'PP002';
    END IF;
    RETURN NEW;
END $$;

CREATE TRIGGER check_move BEFORE INSERT OR UPDATE ON reviews FOR EACH ROW EXECUTE FUNCTION check_review_move();
CREATE TRIGGER keep_row BEFORE DELETE ON reviews FOR EACH ROW EXECUTE FUNCTION forbid_change();
CREATE TRIGGER keep_table BEFORE TRUNCATE ON reviews FOR EACH STATEMENT EXECUTE FUNCTION forbid_change();

-- At the end of the transaction: every move left its row, and approval rests on as many people as the rule asks for.
CREATE FUNCTION check_review_stands() RETURNS trigger LANGUAGE plpgsql SET search_path = public, pg_temp AS $$
DECLARE
    found_review reviews;
    approvals bigint;
    rejected boolean;
BEGIN
    SELECT * INTO found_review FROM reviews
        WHERE id = (CASE WHEN TG_TABLE_NAME = 'reviews' THEN to_jsonb(NEW) ->> 'id' ELSE to_jsonb(NEW) ->> 'review_id' END)::uuid;
    SELECT count(DISTINCT decided_by) FILTER (WHERE kind = 'Approve'), coalesce(bool_or(kind = 'Reject'), false)
        INTO approvals, rejected
        FROM decisions WHERE review_id = found_review.id AND round = found_review.round;
    IF approvals <> found_review.approvals_given OR approvals > found_review.approvals_required THEN
        RAISE EXCEPTION 'The approvals of the review do not agree with its decisions.' USING ERRCODE = 'PP002';
    END IF;
    IF found_review.state IN ('Approved', 'Proved', 'Released') AND (rejected OR approvals < found_review.approvals_required) THEN
        RAISE EXCEPTION 'The review lacks approvals.' USING ERRCODE = 'PP001';
    END IF;
    IF found_review.state = 'InReview' AND (rejected OR approvals >= found_review.approvals_required) THEN
        RAISE EXCEPTION 'The review is decided.' USING ERRCODE = 'PP002';
    END IF;
    IF (SELECT count(*) FROM review_transitions WHERE review_id = found_review.id) <> found_review.latest_transition
        OR found_review.latest_transition > 0 AND NOT EXISTS (
            SELECT FROM review_transitions
            WHERE review_id = found_review.id AND number = found_review.latest_transition AND to_state = found_review.state) THEN
        RAISE EXCEPTION 'A move of the review was not written down.' USING ERRCODE = 'PP002';
    END IF;
    RETURN NULL;
END $$;

CREATE CONSTRAINT TRIGGER check_stands AFTER INSERT OR UPDATE ON reviews
    DEFERRABLE INITIALLY DEFERRED FOR EACH ROW EXECUTE FUNCTION check_review_stands();
CREATE CONSTRAINT TRIGGER check_stands AFTER INSERT ON review_transitions
    DEFERRABLE INITIALLY DEFERRED FOR EACH ROW EXECUTE FUNCTION check_review_stands();
CREATE CONSTRAINT TRIGGER check_stands AFTER INSERT ON decisions
    DEFERRABLE INITIALLY DEFERRED FOR EACH ROW EXECUTE FUNCTION check_review_stands();

-- The decision names uploader and submitter; here they are compared with the truth, and the row's own check does the rest.
CREATE FUNCTION check_decision() RETURNS trigger LANGUAGE plpgsql SET search_path = public, pg_temp AS $$
DECLARE
    found_review reviews;
    uploader uuid;
BEGIN
    SELECT * INTO found_review FROM reviews WHERE id = NEW.review_id FOR UPDATE;
    SELECT uploaded_by INTO uploader FROM revisions WHERE id = found_review.revision_id;
    IF NEW.uploaded_by IS DISTINCT FROM uploader OR NEW.submitted_by IS DISTINCT FROM found_review.submitted_by THEN
        RAISE EXCEPTION 'The decision names the wrong uploader or submitter.' USING ERRCODE = 'PP001';
    END IF;
    IF NEW.round <> found_review.round
        OR found_review.state NOT IN ('InReview', CASE NEW.kind WHEN 'Approve' THEN 'Approved' ELSE 'Rejected' END) THEN
        RAISE EXCEPTION 'The review is not open for decisions.' USING ERRCODE = 'PP002';
    END IF;
    RETURN NEW;
END $$;

CREATE TRIGGER check_decision BEFORE INSERT ON decisions FOR EACH ROW EXECUTE FUNCTION check_decision();
