select `content`
from (select `job_id`, `revision` from (select * from job_facts where branch_id in (select value from json_each(?)) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as `job_facts` where `package_id` = ? and `completed_on` <= ? order by body_type = ? desc, completed_on desc, job_id desc limit ?) as `newest`
inner join `job_revisions` on `job_revisions`.`job_id` = `newest`.`job_id` and `job_revisions`.`revision` = `newest`.`revision`;
